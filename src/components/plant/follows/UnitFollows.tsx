import { inUse } from '../../../contracts/plantChecks';
import type { PlantLibraryDto } from '../../../contracts/plantLibrary';
import type { Units } from '../../units';
import { useUnits } from '../../ui/units';
import type { FormContext } from '../fields';
import { qualityText } from '../listing';
import { Facts, NotYet, type Fact } from './Facts';

/** The header and those that feed it, upwards. */
function chain(library: PlantLibraryDto, headerId: unknown, units: Units): Fact[] {
  const facts: Fact[] = [];
  const seen = new Set<unknown>();
  let id = headerId;
  while (typeof id === 'string' && !seen.has(id)) {
    seen.add(id);
    const header = inUse(library, 'headers', id)?.values;
    if (!header) break;
    const name = facts.length === 0 ? `Draws from ${header.name}` : `let down from ${header.name}`;
    facts.push({ name, value: `${units.text('gaugePressure', header.pressureBarG)}, ${qualityText(header, units)}` });
    id = header.feedKind === 'letdown' ? header.feedFromHeaderId : null;
  }
  return facts;
}

/** The numbers of a vent group that are in force. */
export function ventFacts(library: PlantLibraryDto, id: unknown, units: Units): Fact[] {
  const numbers = typeof id === 'string' ? library.ventNumbers[id] : undefined;
  if (!numbers) return [];
  const { leastHeaderBarG, studyGreatestLoadKgPerH } = numbers;
  return [
    { name: 'Vents at once', value: String(numbers.ventsAtOnce) },
    { name: 'Steam ons at once', value: `${numbers.steamOnsAtOnce} within ${numbers.steamOnMinutes} min` },
    { name: 'Margin after a vent', value: `${numbers.marginMinutes} min` },
    {
      name: 'Least header pressure',
      value: leastHeaderBarG === null ? 'not said' : units.text('gaugePressure', leastHeaderBarG),
    },
    {
      name: 'Greatest load of its study',
      value: studyGreatestLoadKgPerH === null ? 'not said' : units.text('steamRate', studyGreatestLoadKgPerH),
    },
  ];
}

/** Which header and vent group a unit is on. */
export function UnitFollows({ typed, library }: FormContext) {
  const units = useUnits();
  const facts = [...chain(library, typed.headerId, units), ...ventFacts(library, typed.ventGroupId, units)];
  if (facts.length === 0) return <NotYet>Without a header it draws no steam.</NotYet>;
  return <Facts facts={facts} />;
}

/** The numbers of a vent group and where they are from. */
export function VentGroupFollows({ id, library }: FormContext) {
  const units = useUnits();
  const numbers = id === null ? undefined : library.ventNumbers[id];
  if (!numbers) return <NotYet>A new group has one vent and one steam on at a time until a rule is released.</NotYet>;
  return (
    <Facts facts={ventFacts(library, id, units)}>
      <p className="text-sm text-ink-muted">Source: {numbers.source}.</p>
      <a className="text-sm underline underline-offset-2" href={`/plant/practice?group=${id}`}>
        Change them by a practice rule
      </a>
    </Facts>
  );
}
