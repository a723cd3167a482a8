import { QueryProvider } from '../query/client';
import { Desk, type DeskProps } from './Desk';

/** The capacity desk as an island. */
export function CapacityDesk(props: DeskProps) {
  return (
    <QueryProvider>
      <Desk {...props} />
    </QueryProvider>
  );
}
