import type { CapacityDto } from '@/contracts/capacity';
import type { WeekFuel } from '@/core/house/weekFuel';
import type { Result } from '@/core/result';
import { Notice } from '../ui/Notice';
import { useUnits } from '../ui/units';
import type { Units } from '../units';
import { WorkingSteps } from '../working/WorkingSteps';

interface Props {
  readonly fuel: Result<WeekFuel>;
  readonly dto: CapacityDto;
}

interface Row {
  readonly name: string;
  readonly week: string;
  readonly perTonne: string;
}

function rowsOf(fuel: WeekFuel, dto: CapacityDto, units: Units): Row[] {
  const tonnes = dto.placedKg / 1_000;
  const row = (name: string, value: number, text: (value: number, digits?: number) => string): Row => {
    return { name, week: text(value), perTonne: tonnes > 0 ? text(value / tonnes, 1) : '' };
  };
  const rows = [
    row('Steam', fuel.steamKg / 1_000, (v, digits) =>
      units.text('largeMass', v, units.system === 'si' ? (digits ?? 1) + (digits ? 1 : 0) : 0),
    ),
    row('Fuel', fuel.fuelKWh, (v, digits) => units.text('energy', v, units.system === 'si' ? 0 : (digits ?? 0) * 2)),
    row('Carbon dioxide', fuel.co2Kg, (v) => units.text('mass', v)),
  ];
  const { cost } = fuel;
  return cost === null
    ? rows
    : [...rows, row('Cost', cost, (v, digits) => `${dto.currency}\u00a0${money(v, digits ? 2 : 0)}`)];
}

function money(value: number, digits: number): string {
  return value.toFixed(digits).replace(/\B(?=(\d{3})+(?!\d))/g, '\u2009');
}

/** Fuel, cost and carbon dioxide of the week, with where they are from. */
export function FuelPanel({ fuel, dto }: Props) {
  const units = useUnits();
  return (
    <section aria-labelledby="fuel-heading">
      <h2 id="fuel-heading" className="mb-3 text-md font-semibold">
        Fuel of the week as planned
      </h2>
      {fuel.ok ? (
        <>
          <FuelTable rows={rowsOf(fuel.value, dto, units)} hasProduct={dto.placedKg > 0} />
          <p className="mt-2 text-xs text-ink-muted">
            {dto.fuelPricePerKWh === null ? 'No fuel price is set, so no cost is shown. ' : ''}
            {fuel.value.unverified.map((name) => `The factor of ${name.toLowerCase()} is from memory: check it. `)}
            Boilers coming up, purging and standing by are not counted.
          </p>
          <details className="mt-2 text-sm">
            <summary className="w-fit cursor-pointer py-1 font-medium underline decoration-edge underline-offset-3">
              Where from
            </summary>
            <WorkingSteps working={fuel.value.working} compact />
          </details>
        </>
      ) : (
        <Notice look="over">{units.sentence(fuel.error.message)}</Notice>
      )}
    </section>
  );
}

function FuelTable({ rows, hasProduct }: { readonly rows: readonly Row[]; readonly hasProduct: boolean }) {
  return (
    <table className="w-full border-y border-rule text-sm">
      <thead className="text-left text-xs text-ink-muted">
        <tr>
          <th className="py-1.5 font-normal">
            <span className="sr-only">What</span>
          </th>
          <th className="py-1.5 text-right font-normal">the week</th>
          {hasProduct ? <th className="py-1.5 text-right font-normal">per tonne of product placed</th> : null}
        </tr>
      </thead>
      <tbody className="divide-y divide-rule border-t border-rule">
        {rows.map((row) => (
          <tr key={row.name}>
            <th className="py-1.5 text-left font-medium">{row.name}</th>
            <td className="py-1.5 text-right">{row.week}</td>
            {hasProduct ? <td className="py-1.5 text-right text-ink-muted">{row.perTonne}</td> : null}
          </tr>
        ))}
      </tbody>
    </table>
  );
}
