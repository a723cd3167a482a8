import { useState } from 'react';
import type { Breach } from '../../core/schedule/breach';
import { breachSentence, type Names } from '../../core/schedule/sentences';
import type { Clock } from '../time';
import { breachGroups, type BreachClass } from './drawn';

interface Props {
  readonly breaches: readonly Breach[];
  readonly names: Names;
  readonly clock: Clock;
  readonly onGo: (breach: Breach) => void;
}

const CLASS_WORDS: Readonly<Record<BreachClass, { readonly name: string; readonly hint: string }>> = {
  process: { name: 'Process limits', hint: 'can’t be agreed to' },
  steam: { name: 'Steam', hint: '' },
  shared: { name: 'Shared limits', hint: '' },
  time: { name: 'Time and units', hint: '' },
};
const FEW = 6;

/** What is to put right, by class; each line leads to its place. */
export function BreachList({ breaches, names, clock, onGo }: Props) {
  const groups = breachGroups(breaches);
  return (
    <section aria-labelledby="to-put-right">
      <header className="flex items-baseline justify-between">
        <h2 id="to-put-right" className="text-base font-semibold">
          To put right
        </h2>
        <span className="text-sm text-ink-muted" data-testid="breach-count">
          {breaches.length}
        </span>
      </header>
      {groups.length === 0 ? (
        <p className="mt-2 flex gap-2.5 text-sm">
          <span className="w-1 shrink-0 rounded-sm bg-room" aria-hidden="true" />
          <span>Nothing. The plan keeps every limit that is judged.</span>
        </p>
      ) : (
        groups.map((group) => (
          <Group key={group.class} name={group.class} breaches={group.breaches} {...{ names, clock, onGo }} />
        ))
      )}
    </section>
  );
}

function Group({ name, breaches, names, clock, onGo }: Props & { readonly name: BreachClass }) {
  const [all, setAll] = useState(false);
  const words = CLASS_WORDS[name];
  const shown = all ? breaches : breaches.slice(0, FEW);
  return (
    <section className="mt-3" aria-label={words.name}>
      <h3 className="label flex items-baseline justify-between">
        <span>
          {words.name}
          {words.hint ? <span className="font-normal">, {words.hint}</span> : null}
        </span>
        <span>{breaches.length}</span>
      </h3>
      <ul className="mt-1">
        {shown.map((breach) => (
          <Line key={breach.id} {...{ breach, names, clock, onGo }} />
        ))}
      </ul>
      {breaches.length > FEW ? (
        <button type="button" className="link mt-0.5 text-xs" onClick={() => setAll(!all)}>
          {all ? 'Show fewer' : `Show all ${breaches.length}`}
        </button>
      ) : null}
    </section>
  );
}

const BARS: Readonly<Record<BreachClass, string>> = {
  process: 'hatch-over outline outline-1 -outline-offset-1 outline-over',
  steam: 'hatch-over',
  shared: 'bg-ink-muted',
  time: 'bg-rule',
};

function Line({ breach, names, clock, onGo }: Omit<Props, 'breaches'> & { readonly breach: Breach }) {
  const { title, detail } = breachSentence(breach, names, clock.dayTime);
  return (
    <li>
      <button
        type="button"
        onClick={() => onGo(breach)}
        className="-mx-2 flex w-[calc(100%+1rem)] gap-2.5 rounded-sm px-2 py-1.5 text-left hover:bg-sunken"
      >
        <span className={`w-1 shrink-0 self-stretch rounded-sm ${BARS[breach.class]}`} aria-hidden="true" />
        <span className="min-w-0">
          <span className="block text-sm leading-[18px] font-medium">{title}</span>
          <span className="line-clamp-2 text-xs leading-4 text-ink-muted">{detail}</span>
        </span>
      </button>
    </li>
  );
}
