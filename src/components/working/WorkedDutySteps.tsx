import type { Working } from '@/core/duty/working';
import type { UnitSystem } from '@/core/quantity/display';
import { UnitsProvider } from '../ui/units';
import { WorkingSteps } from './WorkingSteps';

interface Props {
  readonly system: UnitSystem;
  readonly working: Working;
  /** Another working on the page has said already in which units formulas stand. */
  readonly isFollowing?: boolean;
}

/** A working on a page of its own. */
export function WorkedDutySteps({ system, working, isFollowing = false }: Props) {
  return (
    <UnitsProvider system={system}>
      {system === 'si' || isFollowing ? null : (
        <p className="mt-8 flex max-w-xl gap-2.5 text-sm text-ink-muted">
          <span className="w-1 shrink-0 rounded-sm bg-edge" aria-hidden="true" />
          Formulas and their inputs stand in SI units, in which they are worked out; results stand in your units beside.
        </p>
      )}
      <WorkingSteps working={working} />
    </UnitsProvider>
  );
}
