import { messageOf } from '../query/api';
import { Button } from '../ui/Button';
import type { WeekState } from './useWeek';

/** Says so when what is shown may be old, and offers to read it again. */
export function ReadTrouble({ server }: { readonly server: WeekState }) {
  if (server.connected && !server.readError) return null;
  const words = server.readError
    ? `The week could not be read anew. ${messageOf(server.readError)}`
    : 'The connection is lost; changes by others are not shown. Trying again.';
  return (
    <div role="status" className="flex items-center gap-3 border-b border-rule bg-sunken px-4 py-1.5 text-sm">
      <span className="hatch-over h-4 w-1 shrink-0 rounded-sm" aria-hidden="true" />
      <span className="flex-1">{words}</span>
      <Button size="small" onClick={server.readAgain}>
        Read it again
      </Button>
    </div>
  );
}
