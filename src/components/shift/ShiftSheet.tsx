import { QueryProvider } from '../query/client';
import { Sheet, type SheetProps } from './Sheet';

/** The shift sheet as an island. */
export function ShiftSheet(props: SheetProps) {
  return (
    <QueryProvider>
      <Sheet {...props} />
    </QueryProvider>
  );
}
