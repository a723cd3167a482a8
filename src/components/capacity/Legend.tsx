import { Hatch } from '../ui/Hatch';

/** What the lines and grounds of the strip are. */
export function Legend() {
  return (
    <ul className="flex flex-wrap gap-x-4 gap-y-1 text-xs text-ink-muted">
      <Entry text="steam limit">
        <path d="M0 6H20" className="stroke-room" strokeWidth="2.5" />
      </Entry>
      <Entry text="net export">
        <path d="M0 6H20" className="stroke-room" strokeWidth="1.25" strokeDasharray="5 4" />
      </Entry>
      <Entry text="the plan’s steam load">
        <rect width="20" height="12" className="fill-steam opacity-45" />
      </Entry>
      <Entry text="users outside the plan">
        <rect width="20" height="12" className="fill-steam" />
      </Entry>
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
