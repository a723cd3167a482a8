import { Hatch } from '../ui/Hatch';
import { Dots } from './Dots';

interface Props {
  readonly hasLargestOut: boolean;
  readonly hasCarried: boolean;
}

/** What the lines and grounds of the strip are. */
export function Legend({ hasLargestOut, hasCarried }: Props) {
  return (
    <ul className="flex flex-wrap gap-x-4 gap-y-1 text-xs text-ink-muted">
      <Entry text="steam limit">
        <path d="M0 6H20" className="stroke-room" strokeWidth="2.5" />
      </Entry>
      <Entry text="net export">
        <path d="M0 6H20" className="stroke-room" strokeWidth="1.25" strokeDasharray="5 4" />
      </Entry>
      {hasLargestOut ? (
        <Entry text="limit with the largest boiler out">
          <path d="M0 6H20" className="stroke-ink-muted" strokeWidth="1.25" strokeDasharray="1 3" />
        </Entry>
      ) : null}
      <Entry text="the plan’s steam load">
        <rect width="20" height="12" className="fill-steam opacity-45" />
      </Entry>
      <Entry text="users outside the plan">
        <rect width="20" height="12" className="fill-steam" />
      </Entry>
      {hasCarried ? (
        <Entry text="carried by the accumulator">
          <defs>
            <Dots id="legend-carried" />
          </defs>
          <rect width="20" height="12" fill="url(#legend-carried)" />
        </Entry>
      ) : null}
      <Entry text="over the limit">
        <defs>
          <Hatch id="legend-over" />
        </defs>
        <rect width="20" height="12" fill="url(#legend-over)" />
      </Entry>
    </ul>
  );
}

function Entry({ text, children }: { readonly text: string; readonly children: React.ReactNode }) {
  return (
    <li className="flex items-center gap-1.5">
      <svg width="20" height="12" aria-hidden="true">
        {children}
      </svg>
      {text}
    </li>
  );
}
