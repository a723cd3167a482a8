import { useCallback, useEffect, useMemo, useState } from 'react';
import type { SampledSpread } from '../../core/header/spread/sampledLoads';
import type { StartSpread } from '../../core/header/spread/startSpread';
import type { TriedPlacement } from '../../core/pipeline';
import type { Week } from '../../core/schedule/week';
import { CONFIDENCES, type Confidence } from './chance';
import type { SpreadAnswer, SpreadAsk } from './spreadDesk';
import { createStore, type Store } from './store';
import { greatestOf } from './strip';
import type { Carrying } from './useCarry';
import { useLatest } from './useLatest';

/** What is shown of early and late starts; the last of it stays until the new is there. */
export interface SpreadShown {
  readonly byHeader: Readonly<Record<string, SampledSpread>>;
  /** Greatest confident load of the week as it stands, by header: the strip keeps its scale under the hand. [kg/h] */
  readonly greatestKgPerH: Readonly<Record<string, number>>;
}

interface Choice {
  readonly on: boolean;
  readonly confidence: Confidence;
}

export interface SpreadControl extends Choice {
  readonly choose: (choice: Partial<Choice>) => void;
  /** Any unit has a spread: without one every week is the plan. */
  readonly known: boolean;
  readonly store: Store<SpreadShown | null>;
  /** The thread could not be had; nothing will come. */
  readonly failed: boolean;
}

interface Ground {
  readonly personId: string;
  readonly week: Week;
  readonly startSpreads: Readonly<Record<string, StartSpread>>;
  readonly carrying: Store<Carrying | null>;
  /** The proposal's moves that are shown. */
  readonly chosen: readonly TriedPlacement[];
}

const NOT_YET: Choice = { on: false, confidence: 0.95 };
/** A dropped activity's own week comes at once; only where none does is the week asked for as it stands. [ms] */
const AFTER_DROP_MS = 120;

/** Early and late starts of the week shown, sampled on a thread of their own and following the hand. */
export function useStartSpread({ personId, week, startSpreads, carrying, chosen }: Ground): SpreadControl {
  const [choice, choose] = useRemembered(`steadmain.startSpread.${personId}`);
  const store = useMemo(() => createStore<SpreadShown | null>(null), []);
  const { on, confidence } = choice;
  const known = Object.keys(startSpreads).length > 0;
  const { ask, failed } = useDesk(on && known, store);
  const changes = useLatest(chosen);

  useEffect(() => {
    const headerIds = week.plant.headers.map(({ id }) => id);
    ask?.({ kind: 'week', week, startSpreads, headerIds, confidence, changes: changes.current });
  }, [ask, week, startSpreads, confidence, changes]);

  useEffect(() => ask?.({ kind: 'try', changes: chosen }), [ask, chosen]);

  useEffect(() => {
    if (!ask) return;
    let after = 0;
    const follow = (): void => {
      const now = carrying.get();
      window.clearTimeout(after);
      if (!now) {
        after = window.setTimeout(() => ask({ kind: 'try', changes: changes.current }), AFTER_DROP_MS);
        return;
      }
      const { activity, target } = now.carry;
      const placement = target?.eligible ? { unitId: target.unitId, start: target.start } : null;
      ask({ kind: 'try', changes: [{ activityId: activity.id, placement }] });
    };
    const unsubscribe = carrying.subscribe(follow);
    return () => {
      window.clearTimeout(after);
      unsubscribe();
    };
  }, [ask, carrying, changes]);

  return { ...choice, choose, known, store, failed };
}

type Ask = (ask: SpreadAsk) => void;

/** The desk on its thread: one question at a time, and after it only the newest of what was asked meanwhile. */
function useDesk(wanted: boolean, store: Store<SpreadShown | null>): { ask: Ask | null; failed: boolean } {
  const [ask, setAsk] = useState<Ask | null>(null);
  const [failed, setFailed] = useState(false);
  useEffect(() => {
    if (!wanted) return;
    const worker = new Worker(new URL('./spread.worker.ts', import.meta.url), { type: 'module' });
    const queue = createQueue((next) => worker.postMessage(next));
    worker.addEventListener('message', (event: MessageEvent<SpreadAnswer>) => {
      const answered = queue.answered();
      if (answered) store.set(shownOf(event.data, answered, store.get()));
    });
    worker.addEventListener('error', () => setFailed(true));
    // eslint-disable-next-line react-hooks/set-state-in-effect -- the thread is begun here and lives as long as the effect
    setAsk(() => queue.ask);
    return () => {
      worker.terminate();
      setAsk(null);
      setFailed(false);
      store.set(null);
    };
  }, [wanted, store]);
  return { ask, failed };
}

/** Sends one question at a time. A week that waits is never lost to a later try: it takes that try's changes along. */
export function createQueue(send: (ask: SpreadAsk) => void) {
  let asked: SpreadAsk | null = null;
  let waiting: SpreadAsk | null = null;
  const next = (): void => {
    if (asked || !waiting) return;
    asked = waiting;
    waiting = null;
    send(asked);
  };
  return {
    ask: (ask: SpreadAsk): void => {
      waiting = ask.kind === 'try' && waiting?.kind === 'week' ? { ...waiting, changes: ask.changes } : ask;
      next();
    },
    /** The question that was answered; the next one goes out. */
    answered: (): SpreadAsk | null => {
      const done = asked;
      asked = null;
      next();
      return done;
    },
  };
}

function shownOf(answer: SpreadAnswer, asked: SpreadAsk, before: SpreadShown | null): SpreadShown {
  const { byHeader } = answer;
  if (asked.kind === 'try' && before) return { byHeader, greatestKgPerH: before.greatestKgPerH };
  const greatest = Object.entries(byHeader).map(([id, spread]) => [id, greatestOf(spread.confidentKgPerH)] as const);
  return { byHeader, greatestKgPerH: Object.fromEntries(greatest) };
}

/** A choice that this browser keeps for a person; where it can't, for as long as the page is open. */
function useRemembered(key: string): [Choice, (choice: Partial<Choice>) => void] {
  const [choice, setChoice] = useState<Choice>(() => readChoice(key));
  const choose = useCallback(
    (part: Partial<Choice>) =>
      setChoice((now) => {
        const next = { ...now, ...part };
        try {
          localStorage.setItem(key, JSON.stringify(next));
        } catch {
          // The browser keeps nothing for this site.
        }
        return next;
      }),
    [key],
  );
  return [choice, choose];
}

function readChoice(key: string): Choice {
  try {
    const kept = JSON.parse(localStorage.getItem(key) ?? 'null') as Partial<Choice> | null;
    const confidence = CONFIDENCES.find((one) => one === kept?.confidence) ?? NOT_YET.confidence;
    return { on: kept?.on === true, confidence };
  } catch {
    return NOT_YET;
  }
}
