import { Fragment, type ReactNode } from 'react';
import type { IssueDto } from '../../contracts/week';
import type { Clock } from '../time';
import { ZOOMS, type Zoom } from './timeScale';

interface Props {
  readonly week: WeekWords;
  readonly clock: Clock;
  readonly issue: IssueDto | null;
  readonly agreedBy: string | null;
  readonly changedSince: boolean;
  readonly zoom: Zoom;
  readonly onZoom: (zoom: Zoom) => void;
  readonly history: {
    readonly canUndo: boolean;
    readonly canRedo: boolean;
    readonly undo: () => void;
    readonly redo: () => void;
  } | null;
  readonly children?: ReactNode;
}

export interface WeekWords {
  readonly title: string;
  readonly span: string;
  readonly previous: string;
  readonly next: string;
  readonly isThisWeek: boolean;
}

/** Which week, how much of it, and what can be done with it. */
export function BoardBar({ week, clock, issue, agreedBy, changedSince, zoom, onZoom, history, children }: Props) {
  return (
    <div className="board-bar flex flex-wrap items-center gap-x-4 gap-y-2 border-b border-rule bg-surface px-4 py-2 max-sm:px-2">
      <nav aria-label="Week" className="flex items-center gap-1">
        <WeekLink to={week.previous} label="Previous week" d="M10 3 5 8l5 5" />
        <WeekLink to={week.next} label="Next week" d="m6 3 5 5-5 5" />
        {week.isThisWeek ? null : (
          <a href="/week" className="rounded-md border border-edge px-2 py-0.5 text-sm hover:border-ink">
            Today
          </a>
        )}
      </nav>
      <div className="min-w-0 flex-1 basis-40">
        <h1 className="truncate text-base leading-5 font-semibold">
          {week.title} <span className="font-normal text-ink-muted max-md:hidden">{week.span}</span>
        </h1>
        <p className="truncate text-xs leading-4 text-ink-muted" data-testid="issue-state">
          {issue
            ? `issue ${issue.number}, on the floor since ${clock.instantDayTime(issue.at)}`
            : 'not on the floor yet'}
          {issue && changedSince ? ', changed since' : ''}
          {agreedBy ? ` · steam agreed to by ${agreedBy}` : ''}
        </p>
      </div>
      <fieldset className="flex overflow-clip rounded-md border border-edge">
        <legend className="sr-only">Shown at once</legend>
        {ZOOMS.map(({ zoom: value, label }) => (
          <Fragment key={value}>
            <label
              className={`px-2.5 py-1 text-sm not-first:border-l has-focus-visible:outline-2 has-focus-visible:outline-focus max-sm:px-1.5 ${value === zoom ? 'bg-ink text-paper' : 'hover:bg-sunken'}`}
            >
              <input
                type="radio"
                name="zoom"
                className="sr-only"
                checked={value === zoom}
                onChange={() => onZoom(value)}
              />
              {label}
            </label>
          </Fragment>
        ))}
      </fieldset>
      {history ? (
        <div className="flex">
          <IconButton
            label="Undo"
            hint="Ctrl+Z"
            disabled={!history.canUndo}
            onClick={history.undo}
            d="M6 3 2.5 6.5 6 10M3 6.5h6a4 4 0 0 1 0 8H7"
          />
          <IconButton
            label="Redo"
            hint="Ctrl+Shift+Z"
            disabled={!history.canRedo}
            onClick={history.redo}
            d="m10 3 3.5 3.5L10 10m3-3.5H7a4 4 0 0 0 0 8h2"
          />
        </div>
      ) : null}
      <div className="flex flex-wrap items-center gap-2">{children}</div>
    </div>
  );
}

function WeekLink({ to, label, d }: { readonly to: string; readonly label: string; readonly d: string }) {
  return (
    <a
      href={`/week/${to}`}
      aria-label={label}
      title={label}
      className="flex size-8 items-center justify-center rounded-md border border-edge hover:border-ink"
    >
      <svg viewBox="0 0 16 16" className="size-4 fill-none stroke-current" strokeWidth="1.6" aria-hidden="true">
        <path d={d} />
      </svg>
    </a>
  );
}

interface IconProps {
  readonly label: string;
  readonly hint: string;
  readonly disabled: boolean;
  readonly onClick: () => void;
  readonly d: string;
}

function IconButton({ label, hint, disabled, onClick, d }: IconProps) {
  return (
    <button
      type="button"
      aria-label={label}
      title={`${label} (${hint})`}
      disabled={disabled}
      onClick={onClick}
      className="flex size-8 items-center justify-center rounded-md enabled:hover:bg-sunken disabled:text-ink-muted disabled:opacity-50"
    >
      <svg viewBox="0 0 16 17" className="size-4 fill-none stroke-current" strokeWidth="1.5" aria-hidden="true">
        <path d={d} />
      </svg>
    </button>
  );
}
