import type { UnitSystem } from '../../core/quantity/display';
import { QueryProvider } from '../query/client';
import { UnitsProvider } from '../ui/units';
import { Library, type LibraryProps } from './Library';

/** One part of the plant's library as an island. */
export function PlantDesk({ units, ...props }: LibraryProps & { readonly units: UnitSystem }) {
  return (
    <QueryProvider>
      <UnitsProvider system={units}>
        <Library {...props} />
      </UnitsProvider>
    </QueryProvider>
  );
}
