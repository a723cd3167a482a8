import type { ReactNode } from 'react';

export type NoticeLook = 'note' | 'good' | 'over' | 'caution';

const BARS: Readonly<Record<NoticeLook, string>> = {
  note: 'bg-edge',
  good: 'bg-room',
  over: 'hatch-over',
  caution: 'bg-ink',
};

interface Props {
  readonly look?: NoticeLook;
  readonly title?: string;
  readonly children?: ReactNode;
  readonly actions?: ReactNode;
  /** Read out as soon as it appears. */
  readonly live?: boolean;
  readonly className?: string;
}

/** A sentence set apart by a bar at its side: what happened, where, and what to do. */
export function Notice({ look = 'note', title, children, actions, live = false, className = '' }: Props) {
  const role = live ? (look === 'over' ? 'alert' : 'status') : undefined;
  return (
    <div role={role} className={`flex gap-3 text-sm ${className}`}>
      <span className={`w-1 shrink-0 rounded-sm ${BARS[look]}`} aria-hidden="true" />
      <div className="min-w-0 py-0.5">
        {title ? <p className="font-semibold text-ink">{title}</p> : null}
        {children ? <div className={title ? 'text-ink-muted' : 'text-ink'}>{children}</div> : null}
        {actions ? <div className="mt-2 flex flex-wrap gap-2">{actions}</div> : null}
      </div>
    </div>
  );
}
