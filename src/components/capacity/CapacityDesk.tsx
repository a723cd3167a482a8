import { QueryProvider } from '../query/client';
import { UnitsProvider } from '../ui/units';
import type { UnitSystem } from '../../core/quantity/display';
import { Desk, type DeskProps } from './Desk';

/** The capacity desk as an island. */
export function CapacityDesk({ units, ...props }: DeskProps & { readonly units: UnitSystem }) {
  return (
    <QueryProvider>
      <UnitsProvider system={units}>
        <Desk {...props} />
      </UnitsProvider>
    </QueryProvider>
  );
}
