import { useState } from 'react';
import { UNIT_KINDS, type CleaningRuleDto, type ProductsDto } from '@/contracts/products';
import type { UnitKind } from '@/core/plant/plant';
import type { UnitSystem } from '@/core/quantity/display';
import { SelectField } from '../ui/Field';
import { UnitsProvider, useUnits } from '../ui/units';
import { CleaningDialog, type CleaningPair } from './CleaningDialog';
import { Families } from './Families';

interface Props {
  readonly dto: ProductsDto;
  readonly mayEdit: boolean;
  readonly whoMay: string;
  readonly system: UnitSystem;
}

const KIND_NAMES: Readonly<Record<UnitKind, string>> = {
  blancher: 'Blanchers',
  kettle: 'Kettles',
  cooker: 'Cookers',
  filler: 'Fillers',
  retort: 'Retorts',
  pasteuriser: 'Pasteurisers',
  other: 'Other units',
};

/** What follows on a kind of unit between a run of one family and a run of another, as a grid. */
export function CleaningGrid({ dto, mayEdit, whoMay, system }: Props) {
  const present = UNIT_KINDS.filter((kind) => dto.choices.units.some((unit) => unit.kind === kind));
  const [kind, setKind] = useState<UnitKind>(
    present.find((one) => dto.cleaning.some((rule) => rule.unitKind === one)) ?? present[0] ?? 'other',
  );
  const [pair, setPair] = useState<CleaningPair | null>(null);
  const ruleOf = (from: string, to: string) =>
    dto.cleaning.find((rule) => rule.unitKind === kind && rule.fromFamilyId === from && rule.toFamilyId === to);
  return (
    <UnitsProvider system={system}>
      <Families families={dto.families} mayEdit={mayEdit} />
      <h2 className="mt-10 text-lg">Cleaning between two runs</h2>
      <p className="mt-1 mb-4 max-w-2xl text-sm text-ink-muted">
        It follows the earlier run by itself and draws its own steam; moving a batch moves it. {whoMay}
      </p>
      <SelectField
        label="On"
        className="w-56"
        value={kind}
        onChange={(event) => setKind(event.target.value as UnitKind)}
      >
        {present.map((one) => (
          <option key={one} value={one}>
            {KIND_NAMES[one]}
          </option>
        ))}
      </SelectField>
      <div className="overflow-x-auto rounded-md border border-rule bg-surface">
        <table className="w-full min-w-max border-collapse text-sm">
          <thead>
            <tr>
              <th scope="col" className="label px-3 py-2 text-left">
                after, before
              </th>
              {dto.families.map(({ id, name }) => (
                <th key={id} scope="col" className="label border-l border-rule px-3 py-2 text-left">
                  {name}
                </th>
              ))}
            </tr>
          </thead>
          <tbody>
            {dto.families.map((from) => (
              <tr key={from.id}>
                <th scope="row" className="label border-t border-rule px-3 py-2 text-left">
                  {from.name}
                </th>
                {dto.families.map((to) => (
                  <td key={to.id} className="border-t border-l border-rule p-0 align-top">
                    <Cell
                      rule={ruleOf(from.id, to.id)}
                      label={`After ${from.name}, before ${to.name}`}
                      mayEdit={mayEdit}
                      onOpen={() => setPair({ unitKind: kind, from, to, rule: ruleOf(from.id, to.id) ?? null })}
                    />
                  </td>
                ))}
              </tr>
            ))}
          </tbody>
        </table>
      </div>
      {pair ? <CleaningDialog pair={pair} choices={dto.choices} onClose={() => setPair(null)} /> : null}
    </UnitsProvider>
  );
}

interface CellProps {
  readonly rule: CleaningRuleDto | undefined;
  readonly label: string;
  readonly mayEdit: boolean;
  readonly onOpen: () => void;
}

function Cell({ rule, label, mayEdit, onOpen }: CellProps) {
  const units = useUnits();
  const steam = rule && rule.steamKg > 0 ? `${units.text('mass', rule.steamKg)}` : 'no steam';
  const inside = rule ? (
    <>
      <span className="block font-medium">
        {rule.kind} {rule.minutes}&nbsp;min
      </span>
      <span className="block text-xs text-ink-muted">{steam}</span>
    </>
  ) : (
    <span className="text-ink-muted">nothing</span>
  );
  if (!mayEdit) return <div className="px-3 py-2">{inside}</div>;
  return (
    <button type="button" className="w-full px-3 py-2 text-left hover:bg-sunken" onClick={onOpen}>
      <span className="sr-only">{label}: </span>
      {inside}
    </button>
  );
}
