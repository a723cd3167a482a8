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
  readonly perProduct: string;
}

/** What figures of product are told by: a tonne, or a thousand pounds. [kg] */
function productUnit(units: Units): { readonly kg: number; readonly name: string } {
  const isSi = units.system === 'si';
  return isSi
    ? { kg: 1_000, name: 'per tonne of product' }
    : { kg: units.inside('mass', 1_000), name: 'per 1 000 lb of product' };
}

function rowsOf(fuel: WeekFuel, dto: CapacityDto, units: Units): Row[] {
  const products = dto.placedKg / productUnit(units).kg;
  const row = (name: string, value: number, text: (value: number) => string, each = text): Row => {
    return { name, week: text(value), perProduct: products > 0 ? each(value / products) : '' };
  };
  const mass = (kg: number) => units.text('mass', kg);
  const rows = [
    row('Steam', fuel.steamKg, (kg) => units.text('largeMass', kg / 1_000), mass),
    row('Fuel', fuel.fuelKWh, (kWh) => units.text('energy', kWh)),
    row('Carbon dioxide', fuel.co2Kg, (kg) => units.text('largeMass', kg / 1_000), mass),
  ];
  const { cost } = fuel;
  const money = (digits: number) => (value: number) => `${dto.currency}\u00a0${grouped(value, digits)}`;
  return cost === null ? rows : [...rows, row('Cost', cost, money(0), money(2))];
}

function grouped(value: number, digits: number): string {
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
          <FuelTable
            rows={rowsOf(fuel.value, dto, units)}
            product={dto.placedKg > 0 ? productUnit(units).name : null}
          />
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

/** `product` null: nothing is placed. */
function FuelTable({ rows, product }: { readonly rows: readonly Row[]; readonly product: string | null }) {
  return (
    <table className="w-full border-y border-rule text-sm">
      <thead className="text-left text-xs text-ink-muted">
        <tr>
          <th className="py-1.5 font-normal">
            <span className="sr-only">What</span>
          </th>
          <th className="py-1.5 text-right font-normal">the week</th>
          {product ? <th className="py-1.5 text-right font-normal">{product} placed</th> : null}
        </tr>
      </thead>
      <tbody className="divide-y divide-rule border-t border-rule">
        {rows.map((row) => (
          <tr key={row.name}>
            <th className="py-1.5 text-left font-medium">{row.name}</th>
            <td className="py-1.5 text-right">{row.week}</td>
            {product ? <td className="py-1.5 text-right text-ink-muted">{row.perProduct}</td> : null}
          </tr>
        ))}
      </tbody>
    </table>
  );
}
