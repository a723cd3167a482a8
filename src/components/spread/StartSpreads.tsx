import { useRef, useState } from 'react';
import type { SpreadListDto, UnitSpreadDto } from '../../contracts/spread';
import type { UnitSystem } from '../../core/quantity/display';
import { UnitsProvider } from '../ui/units';
import { Histogram } from './Histogram';
import { spanOf, spreadText, type SpreadSpan } from './histogram';
import { SpreadForm } from './SpreadForm';

interface Props {
  readonly list: SpreadListDto;
  readonly mayEdit: boolean;
  /** Who may, where this person may not. */
  readonly whoMay: string;
  readonly units: UnitSystem;
}

/** The start spreads of all units by line, and one of them to be set, as an island. */
export function StartSpreads({ list, mayEdit, whoMay, units: system }: Props) {
  const [units, setUnits] = useState(list.units);
  const [chosenId, setChosenId] = useState(list.units[0]?.unitId ?? null);
  const formRef = useRef<HTMLDivElement>(null);
  const choose = (unitId: string): void => {
    setChosenId(unitId);
    // Below each other the form is out of sight.
    if (window.matchMedia('(max-width: 1023px)').matches) formRef.current?.scrollIntoView({ block: 'start' });
  };
  const chosen = units.find(({ unitId }) => unitId === chosenId);
  const span = spanOf(units.flatMap(({ spread }) => (spread ? [spread.outcomes] : [])));
  const lines = [...new Set(units.map(({ lineName }) => lineName))];
  const saved = (unit: UnitSpreadDto): void =>
    setUnits((now) => now.map((one) => (one.unitId === unit.unitId ? unit : one)));
  return (
    <UnitsProvider system={system}>
      <div className="mt-6 grid gap-x-10 gap-y-8 lg:grid-cols-[minmax(0,1fr)_24rem]">
        <div>
          {lines.map((line) => (
            <section key={line} aria-label={line} className="mb-6">
              <h2 className="label">{line}</h2>
              <ul className="mt-1 divide-y divide-rule border-y border-rule">
                {units
                  .filter(({ lineName }) => lineName === line)
                  .map((unit) => (
                    <UnitLine
                      key={unit.unitId}
                      {...{ unit, span }}
                      chosen={unit.unitId === chosenId}
                      onChoose={() => choose(unit.unitId)}
                    />
                  ))}
              </ul>
            </section>
          ))}
        </div>
        <div ref={formRef} className="scroll-mt-20 lg:sticky lg:top-20 lg:self-start">
          {chosen ? (
            <SpreadForm key={chosen.unitId} unit={chosen} onSaved={saved} {...{ list, mayEdit, whoMay }} />
          ) : (
            <p className="text-md">There are no units in use yet.</p>
          )}
        </div>
      </div>
    </UnitsProvider>
  );
}

interface LineProps {
  readonly unit: UnitSpreadDto;
  readonly span: SpreadSpan;
  readonly chosen: boolean;
  readonly onChoose: () => void;
}

function UnitLine({ unit, span, chosen, onChoose }: LineProps) {
  const { spread, source, recorded } = unit;
  return (
    <li>
      <button
        type="button"
        aria-pressed={chosen}
        onClick={onChoose}
        className={`grid w-full grid-cols-[8rem_1fr] items-center gap-x-4 px-2 py-2 text-left hover:bg-sunken sm:grid-cols-[8rem_10rem_1fr_6rem] ${chosen ? 'bg-focus-soft' : ''}`}
      >
        <span className="font-medium">{unit.name}</span>
        <span className="max-sm:hidden">
          {spread ? (
            <Histogram outcomes={spread.outcomes} span={span} heightPx={22} label={spreadText(spread)} />
          ) : null}
        </span>
        <span className="min-w-0 text-sm">
          <span className={spread ? '' : 'text-ink-muted'}>{spreadText(spread)}</span>
          <span className="block truncate text-xs text-ink-muted">{source}</span>
        </span>
        <span className="text-right text-xs text-ink-muted max-sm:hidden">
          {recorded.count === 0 ? '' : `${recorded.count} recorded`}
        </span>
      </button>
    </li>
  );
}
