import { describe, expect, it } from 'vitest';
import type { LevellingProgress } from '@/core/levelling/levelWeek';
import { levelWeek } from '@/solver/levelWeek';
import { startLevelling } from '@/solver/levellingClient';
import { demoWeek } from '@/server/demo/demoWeek';
import type { Week } from '@/core/schedule/week';
import { activity, mode, phase, unit, week } from '../../support/levellingCases';

const ENTRY = new URL('../../../src/solver/levelling.thread.ts', import.meta.url).href;
/** The thread runs from source here, through a loader; in use it is a built script. */
const SCRIPT = `import('tsx/esm/api').then(({ register }) => { register(); return import(${JSON.stringify(ENTRY)}); })`;
const FROM_SOURCE = { eval: true };

function twoVents(): Week {
  const vents = [phase('vent', 0, 6, 800)];
  return week({
    limitKgPerH: 1000,
    units: [unit('R1', 'retort'), unit('R2', 'retort')],
    activities: ['R1', 'R2'].map((id) =>
      activity(`load-${id}`, { modes: [mode(id, 60, vents)], placement: { unitId: id, start: 360 } }),
    ),
  });
}

describe('levelling on a thread of its own', () => {
  it('answers as it does on this thread, with progress on the way', async () => {
    const progress: LevellingProgress[] = [];
    const options = { budget: { iterations: 300 } };
    const job = { week: twoVents(), options, onProgress: (p: LevellingProgress) => void progress.push(p) };
    const { proposal } = await startLevelling(SCRIPT, job, FROM_SOURCE).result;
    expect(proposal).toEqual(levelWeek(twoVents(), options, { now: undefined }).proposal);
    expect(proposal.after.overKg).toBe(0);
    expect(progress.length).toBeGreaterThan(1);
    expect(progress.at(-1)?.overKg).toBe(0);
  }, 60_000);

  it('stops when it is cancelled, with the best found so far', async () => {
    const running = startLevelling(SCRIPT, { week: twoVents(), options: { budget: { iterations: 1e9 } } }, FROM_SOURCE);
    running.cancel();
    const result = await running.result;
    expect(result.cancelled).toBe(true);
    expect(result.iterations).toBeLessThan(1e9);
  }, 60_000);

  it('gives the identical plan each time on two threads that meet, and no worse a plan than one alone', async () => {
    const job = { week: demoWeek(), options: { budget: { iterations: 2_400 } } };
    const two = () => startLevelling(SCRIPT, { ...job, threads: 2 }, FROM_SOURCE).result;
    const [first, second, alone] = [await two(), await two(), await startLevelling(SCRIPT, job, FROM_SOURCE).result];
    expect(second.proposal).toEqual(first.proposal);
    expect(first.proposal.after.overKg).toBeLessThanOrEqual(alone.proposal.after.overKg + 1e-6);
    expect(first.proposal.after.lateMinutes).toBeLessThanOrEqual(alone.proposal.after.lateMinutes);
  }, 120_000);

  it('fails where the thread dies without an answer', async () => {
    const running = startLevelling(SCRIPT, { week: twoVents(), options: { budget: { iterations: 1e9 } } }, FROM_SOURCE);
    const ended = expect(running.result).rejects.toThrow(/before it had an answer/);
    await running.kill();
    await ended;
  }, 60_000);
});
