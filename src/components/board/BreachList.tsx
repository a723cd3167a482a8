import { useState } from 'react';
import type { Breach } from '../../core/schedule/breach';
import { breachSentence, type Names } from '../../core/schedule/sentences';
import type { Clock } from '../time';
import type { WantedClean } from './cleans';
import { breachGroups, type BreachClass, type BreachGroup } from './drawn';

interface Share {
  readonly names: Names;
  readonly clock: Clock;
  readonly onGo: (breach: Breach) => void;
  /** The clean that would put a breach right, where one can be added. */
  readonly wantedClean: (breach: Breach) => WantedClean | null;
  readonly onClean: (wanted: WantedClean) => void;
}

interface Props extends Share {
  readonly breaches: readonly Breach[];
  readonly nowMin: number;
}

const CLASS_WORDS: Readonly<Record<BreachClass, string>> = {
  process: 'Process limits, never to be agreed to',
  steam: 'Steam',
  shared: 'Shared limits',
  time: 'Time and units',
};
const FEW = 6;

/** What is to put right, by class; each line leads to its place. */
export function BreachList({ breaches, nowMin, ...share }: Props) {
  const groups = breachGroups(breaches, nowMin);
  return (
    <section aria-labelledby="to-put-right">
      <header className="flex items-baseline justify-between">
        <h2 id="to-put-right" className="text-base font-semibold">
          To put right
        </h2>
        <span className="text-sm text-ink-muted" data-testid="breach-count">
          {groups.reduce((sum, group) => sum + group.breaches.length, 0)}
        </span>
      </header>
      {groups.length === 0 ? (
        <p className="mt-2 flex gap-2.5 text-sm">
          <span className="w-1 shrink-0 rounded-sm bg-room" aria-hidden="true" />
          <span>Nothing. The plan keeps every limit that is judged.</span>
        </p>
      ) : (
        groups.map((group) => <Group key={group.class} group={group} {...share} />)
      )}
    </section>
  );
}

function Group({ group, ...share }: Share & { readonly group: BreachGroup }) {
  const [all, setAll] = useState(false);
  const { breaches, past } = group;
  const shown = all ? [...past, ...breaches] : breaches.slice(0, FEW);
  const hidden = breaches.length + past.length - shown.length;
  const name = CLASS_WORDS[group.class];
  return (
    <section className="mt-3" aria-label={name}>
      <h3 className="label flex items-baseline justify-between">
        <span>{name}</span>
        <span>{breaches.length}</span>
      </h3>
      <Lines breaches={shown} {...share} />
      {all || hidden > 0 ? (
        <button type="button" className="link mt-1 text-xs" onClick={() => setAll(!all)}>
          {all ? 'Show fewer' : moreWords(breaches.length - shown.length, past.length)}
        </button>
      ) : null}
    </section>
  );
}

function moreWords(more: number, past: number): string {
  const words = [more > 0 ? `${more} more` : '', past > 0 ? `${past} already past` : ''].filter((w) => w !== '');
  return `Show ${words.join(' and ')}`;
}

/** Lines below the day that they are on. */
function Lines({ breaches, ...share }: Share & { readonly breaches: readonly Breach[] }) {
  const { clock } = share;
  return (
    <ul>
      {breaches.map((breach, i) => {
        const before = breaches[i - 1];
        const newDay = !before || clock.day(before.from) !== clock.day(breach.from);
        return (
          <li key={breach.id}>
            {newDay ? <p className="mt-1.5 text-2xs text-ink-muted">{clock.day(breach.from)}</p> : null}
            <Line breach={breach} {...share} />
            <CleanButton breach={breach} {...share} />
          </li>
        );
      })}
    </ul>
  );
}

const BARS: Readonly<Record<BreachClass, string>> = {
  process: 'hatch-over outline outline-1 -outline-offset-1 outline-over',
  steam: 'hatch-over',
  shared: 'bg-ink-muted',
  time: 'bg-edge',
};

/** Below what a clean would put right. */
function CleanButton({ breach, names, wantedClean, onClean }: Share & { readonly breach: Breach }) {
  const wanted = wantedClean(breach);
  if (!wanted) return null;
  return (
    <button type="button" className="link mb-1 ml-3.5 text-xs" onClick={() => onClean(wanted)}>
      Add a clean for {names.unit(wanted.unitId)}
    </button>
  );
}

function Line({ breach, names, clock, onGo }: Share & { readonly breach: Breach }) {
  const sameDay = clock.day(breach.from) === clock.day(Math.max(breach.from, breach.to - 1));
  const { title, detail } = breachSentence(breach, names, sameDay ? clock.time : clock.dayTime);
  return (
    <button
      type="button"
      onClick={() => onGo(breach)}
      className="-mx-2 flex w-[calc(100%+1rem)] gap-2.5 rounded-sm px-2 py-1 text-left hover:bg-sunken"
    >
      <span className={`w-1 shrink-0 self-stretch rounded-sm ${BARS[breach.class]}`} aria-hidden="true" />
      <span className="min-w-0">
        <span className="block text-sm leading-[18px] font-medium">{title}</span>
        <span className="line-clamp-2 text-xs leading-4 text-ink-muted">{detail}</span>
      </span>
    </button>
  );
}
