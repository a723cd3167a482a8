import type { LevellingProgressDto } from '@/contracts/levelling';
import type { LevellingProgress, LevellingResult } from '@/core/levelling/levelWeek';
import type { LevellingOptions } from '@/core/levelling/options';
import type { Week } from '@/core/schedule/week';
import { db, type Db } from '@/db/client';
import type { RunningLevelling, startLevelling } from '@/solver/levellingClient';
import { now } from '../clock';
import { notify } from '../events/notify';
import { findWeek, planOf } from '../weeks/findWeek';
import { weekOfPlan } from '../weeks/weekOfPlan';
import { minuteOf, type WeekTime } from '../weeks/weekTime';
import { disagreement } from './checkProposal';
import { withFullFigures } from './fullFigures';
import type { RunRow } from './runDto';
import { beat, giveBackRun, moveRun, setRunRevision, takeRun, type RunEnd } from './runs.repo';

const BEAT_MS = 1_000;
const ANSWER_WITHIN_MS = 10_000;

export type StartThread = (job: Parameters<typeof startLevelling>[1]) => RunningLevelling;

export interface RunnerOptions {
  readonly startThread: StartThread;
  /** Aborted when the process is asked to stop: the run goes back to the queue. */
  readonly stop?: AbortSignal;
  /** Puts a run that was given back into the queue, within the transaction. */
  readonly requeue?: (tx: Db, runId: string) => Promise<void>;
}

/** Works on a run of the queue to its end: proposed, cancelled or failed. Does nothing where the run was taken. */
export async function workOnRun(runId: string, options: RunnerOptions): Promise<void> {
  const run = await takeRun(db, runId);
  if (!run) return;
  await tell(db, run);
  const end = await level(run, options).catch((error: unknown): RunEnd => {
    console.error(`levelling ${run.id} failed:`, error);
    return { state: 'failed', failure: FAULT };
  });
  await db.transaction(async (tx) => {
    if (end === 'giveBack') {
      if (await giveBackRun(tx, run.id)) await options.requeue?.(tx, run.id);
    } else if (end) await moveRun(tx, run.id, ['running'], end, now());
    await tell(tx, run);
  });
}

const FAULT = 'Something went wrong while levelling; nothing was changed. Level again, then tell your administrator.';
const DOUBTED =
  'The proposal did not stand up to a second check and was put away; nothing was changed. Tell your administrator.';

const tell = (tx: Db, { id, plantId, planId }: RunRow): Promise<void> =>
  notify(tx, plantId, { kind: 'levelling', planId, runId: id });

type TakenRun = NonNullable<Awaited<ReturnType<typeof takeRun>>>;

async function level(run: TakenRun, options: RunnerOptions): Promise<RunEnd | 'giveBack' | null> {
  const { week, time } = await freshWeek(run);
  const progress: LevellingProgressDto[] = [];
  let latest: LevellingProgress | null = null;
  const running = options.startThread({
    week,
    options: optionsOf(run, time),
    onProgress: (found) => (latest = found),
  });
  const watch = watchRun(run, running, options.stop, () => {
    if (latest && latest.ms !== progress.at(-1)?.ms) progress.push(progressDto(latest));
    return progress;
  });
  // A thread that is ended by force rejects when nobody waits for it any more.
  running.result.catch(() => undefined);
  try {
    const result = await Promise.race([running.result, watch.lost]);
    if (watch.reason === 'stop') return 'giveBack';
    if (watch.reason === 'cancel') return { state: 'cancelled' };
    return result === null || watch.reason === 'lost' ? null : judged(run, week, result);
  } finally {
    watch.end();
    await running.kill();
  }
}

/** The week as it is when the work begins, whatever it was when the run was asked for. */
async function freshWeek(run: TakenRun): Promise<{ week: Week; time: WeekTime }> {
  return db.transaction(
    async (tx) => {
      const found = await findWeek({ plantId: run.plantId }, run.weekStart, tx);
      if (!found.ok) throw new Error(found.error.message);
      const plan = await planOf(tx, found.value);
      await setRunRevision(tx, run.id, plan.revision);
      return { week: (await weekOfPlan(tx, found.value, plan)).week, time: found.value.time };
    },
    { isolationLevel: 'repeatable read' },
  );
}

/** Starts before now stand as they are, whatever was asked. */
function optionsOf(run: RunRow, time: WeekTime): LevellingOptions {
  const { fromMin, toMin, mayChangeUnit, greatestShiftMin, seconds } = run.options as Partial<
    Record<string, number> & { mayChangeUnit: boolean }
  >;
  return {
    span: { from: Math.max(0, minuteOf(time, now()) + 1, fromMin ?? 0), to: toMin ?? time.horizonMin },
    ...(mayChangeUnit === undefined ? {} : { mayChangeUnit }),
    ...(greatestShiftMin === undefined ? {} : { greatestShiftMin }),
    budget: { ms: (seconds ?? 15) * 1_000 },
  };
}

const progressDto = ({ ms, overKg, lateMin, movedMin }: LevellingProgress): LevellingProgressDto => {
  return { ms: Math.round(ms), overKg, lateMin, movedMin };
};

function judged(run: RunRow, week: Week, { proposal, withheld }: LevellingResult): RunEnd {
  const doubt = withheld ? 'the solver withheld its own plan' : disagreement(week, proposal);
  if (doubt === null) return { state: 'proposed', proposal: withFullFigures(week, proposal) };
  console.error(`levelling ${run.id}: proposal put away: ${doubt}`);
  return { state: 'failed', failure: DOUBTED };
}

interface Watch {
  /** Why the thread was stopped, if it was. */
  readonly reason: 'cancel' | 'stop' | 'lost' | null;
  /** Settles with null where the thread does not answer to being stopped. */
  readonly lost: Promise<null>;
  readonly end: () => void;
}

/** Beats once a second and stops the thread when the run is cancelled, lost to another hand, or the process stops. */
function watchRun(
  run: RunRow,
  running: RunningLevelling,
  stop: AbortSignal | undefined,
  progress: () => readonly LevellingProgressDto[],
): Watch {
  let reason: Watch['reason'] = null;
  let giveUp: (nothing: null) => void = () => undefined;
  let patience: NodeJS.Timeout | undefined;
  const lost = new Promise<null>((resolve) => (giveUp = resolve));
  const halt = (why: NonNullable<Watch['reason']>): void => {
    if (reason !== null) return;
    reason = why;
    running.cancel();
    patience = setTimeout(() => giveUp(null), ANSWER_WITHIN_MS);
  };
  const onStop = (): void => halt('stop');
  const beats = setInterval(() => {
    void (async () => {
      const mine = await beat(db, run.id, progress());
      if (mine === null) return halt('lost');
      if (mine.cancelAsked) halt('cancel');
      await tell(db, run);
    })().catch((error: unknown) => console.error(`levelling ${run.id}: no heartbeat:`, error));
  }, BEAT_MS);
  stop?.addEventListener('abort', onStop);
  if (stop?.aborted) onStop();
  return {
    get reason() {
      return reason;
    },
    lost,
    end: () => {
      clearInterval(beats);
      clearTimeout(patience);
      stop?.removeEventListener('abort', onStop);
    },
  };
}
