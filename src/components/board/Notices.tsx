import { Notice } from '../ui/Notice';
import { useUnits } from '../ui/units';
import type { BoardNotice } from './notices';

interface Props {
  readonly notices: readonly BoardNotice[];
  readonly onDismiss: (id: number) => void;
}

/** What a person has to know stays until it is put away. */
export function Notices({ notices, onDismiss }: Props) {
  const units = useUnits();
  return (
    <div
      className="pointer-events-none fixed bottom-4 left-4 z-50 flex w-96 max-w-[calc(100vw-2rem)] flex-col gap-2"
      data-testid="notices"
    >
      {notices.map((notice) => (
        <div key={notice.id} className="float pointer-events-auto flex items-start gap-2 p-3">
          <Notice look={notice.look} title={units.message(notice.title)} live className="flex-1">
            {notice.lines.map((line) => (
              <p key={line}>{units.message(line)}</p>
            ))}
          </Notice>
          <button
            type="button"
            aria-label="Put away"
            onClick={() => onDismiss(notice.id)}
            className="flex size-6 shrink-0 items-center justify-center rounded-sm hover:bg-sunken"
          >
            <svg viewBox="0 0 16 16" className="size-3.5 stroke-current" aria-hidden="true">
              <path d="m3.5 3.5 9 9m0-9-9 9" strokeWidth="1.5" />
            </svg>
          </button>
        </div>
      ))}
    </div>
  );
}
