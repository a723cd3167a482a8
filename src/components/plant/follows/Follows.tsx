import type { ReactNode } from 'react';
import type { ThingKind } from '../../../contracts/plantLibrary';
import type { FormContext } from '../fields';
import { AccumulatorFollows } from './AccumulatorFollows';
import { BoilerFollows } from './BoilerFollows';
import { HeaderFollows } from './HeaderFollows';
import { UnitFollows, VentGroupFollows } from './UnitFollows';
import { BaseFollows, LimitFollows } from './WeekFollows';

const FOLLOWS: Readonly<Partial<Record<ThingKind, (context: FormContext) => ReactNode>>> = {
  headers: HeaderFollows,
  boilers: BoilerFollows,
  units: UnitFollows,
  ventGroups: VentGroupFollows,
  accumulators: AccumulatorFollows,
  sharedLimits: LimitFollows,
  baseLoads: BaseFollows,
};

/** What follows from what is typed, beside the form. */
export function Follows({ kind, ...context }: FormContext & { readonly kind: ThingKind }) {
  const Part = FOLLOWS[kind];
  if (!Part) return null;
  return (
    <section aria-label="What follows" data-testid="follows" className="rounded-md bg-sunken p-4 xl:sticky xl:top-16">
      <h3 className="mb-2 text-base">What follows</h3>
      <Part {...context} />
    </section>
  );
}
