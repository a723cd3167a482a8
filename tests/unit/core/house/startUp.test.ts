import { describe, expect, it } from 'vitest';
import { firesOf } from '@/core/house/readiness';
import { startUpSequence, type StartUpBoiler, type StartUpInput } from '@/core/house/startUp';
import { startUpDraws, type StartUpDraw } from '@/core/house/startUpDraws';
import type { Step } from '@/core/time/stepFunction';
import { activity, header, phase, placedAt, plant, unit } from '../../../support/builders';

const times = { purgeMinutes: 5, warmReadyMinutes: 30, coldReadyMinutes: 120 };
const HORIZON = 10_080;
const boiler = (id: string, share: readonly Step[], netKgPerH = 2_000): StartUpBoiler => {
  return { id, times, netKgPerH, fires: firesOf(share, times, HORIZON) };
};
const lit = (from: number, to = HORIZON): Step[] => [
  { from: 0, value: 0 },
  { from, value: 1 },
  { from: to, value: 0 },
];
const draw = (headerId: string, fromMin: number, kind: StartUpDraw['kind'] = 'steamOn'): StartUpDraw => {
  return { headerId, unitId: 'u', activityId: `${headerId}-${fromMin}`, kind, fromMin, toMin: fromMin + 10 };
};
const HEADERS = [
  { id: 'main', fromHeaderId: null, warmUpMinutes: 20, warmUpKg: 40 },
  { id: 'low', fromHeaderId: 'main', warmUpMinutes: 15, warmUpKg: 10 },
];
const load = (from: number, kgPerH: number) => new Float64Array(HORIZON).fill(kgPerH, from);
const sequence = (changes: Partial<StartUpInput>) =>
  startUpSequence({
    headerId: 'main',
    headers: HEADERS,
    boilers: [boiler('one', lit(200))],
    draws: [draw('main', 360)],
    loadKgPerH: load(360, 1_000),
    reserveFraction: 0.1,
    ...changes,
  });
const lines = (start: ReturnType<typeof sequence>[number] | undefined) =>
  start?.steps.map((step) => `${step.atMin} ${step.kind}`);

describe('starting up after an outage', () => {
  it('is tied back from the first steam-on: mains, pressure, purge, lit', () => {
    const [start, ...more] = sequence({});
    expect(more).toEqual([]);
    // 360 first steam-on; 20 min for the mains: 340 at pressure; 120 min cold and 5 min purge: lit by 215.
    expect(lines(start)).toEqual([
      '215 light',
      '220 purged',
      '340 pressure',
      '340 openMains',
      '360 mainsReady',
      '360 steamOn',
    ]);
    expect(start?.late).toEqual([]);
    expect(start?.steps[0]).toMatchObject({ boilerId: 'one', start: 'cold', minutes: 125 });
  });

  it('opens the mains above in time for those below', () => {
    const [start] = sequence({ draws: [draw('low', 350), draw('main', 360)] });
    // The lower header: 350 - 15 = 335 opened; the main header is ready by then, opened at 315.
    expect(lines(start)).toEqual([
      '190 light',
      '195 purged',
      '315 pressure',
      '315 openMains',
      '335 mainsReady',
      '335 openMains',
      '350 mainsReady',
      '350 steamOn',
      '360 steamOn',
    ]);
    expect(start?.late).toEqual([{ boilerId: 'one', neededLitMin: 190, setLitMin: 200, lateMin: 10 }]);
  });

  it('has cold machines warmed up before their first run', () => {
    const [start] = sequence({ draws: [draw('main', 340, 'warmUp'), draw('main', 360), draw('main', 400, 'warmUp')] });
    expect(lines(start)?.slice(-3)).toEqual(['340 mainsReady', '340 warmUp', '360 steamOn']);
    expect(start?.firstDrawMin).toBe(340);
  });

  it('has a second boiler lit for the load that the first does not carry', () => {
    const boilers = [boiler('one', lit(100)), boiler('two', lit(500))];
    const loadKgPerH = load(360, 1_000).fill(1_801, 500);
    const [start] = sequence({ boilers, loadKgPerH });
    // 2 000 kg/h less the reserve of 10 % are passed at 500: lit by 500 - 125.
    expect(start?.steps.find((s) => s.kind === 'light' && s.boilerId === 'two')).toMatchObject({ atMin: 375 });
    expect(start?.late).toEqual([{ boilerId: 'two', neededLitMin: 375, setLitMin: 500, lateMin: 125 }]);
    expect(sequence({ boilers, loadKgPerH: load(360, 1_800) })[0]?.late).toEqual([]);
  });

  it('warns where no firing is set, and takes the boilers in their order then', () => {
    const cold = [{ from: 0, value: 0 }];
    const [start] = sequence({ boilers: [boiler('one', cold), boiler('two', cold)] });
    expect(start?.late).toEqual([{ boilerId: 'one', neededLitMin: 215, setLitMin: null, lateMin: null }]);
  });

  it('comes up warm after a short outage in the week', () => {
    const share = [
      { from: -2_880, value: 1 },
      { from: 1_000, value: 0 },
      { from: 1_100, value: 1 },
    ];
    const [start] = sequence({ boilers: [boiler('one', share)], draws: [draw('main', 360), draw('main', 1_200)] });
    expect(start?.steps[0]).toMatchObject({ kind: 'light', atMin: 1_200 - 20 - 35, start: 'warm' });
    expect(start).toMatchObject({ outSinceMin: 1_000, firstDrawMin: 1_200, late: [] });
  });

  it('says nothing where a fire burns all along, or nothing draws afterwards', () => {
    expect(sequence({ boilers: [boiler('one', [{ from: -2_880, value: 1 }])] })).toEqual([]);
    expect(sequence({ draws: [] })).toEqual([]);
  });

  it('gives each outage its own sequence', () => {
    const share = [
      { from: 0, value: 0 },
      { from: 100, value: 1 },
      { from: 2_000, value: 0 },
      { from: 2_800, value: 1 },
    ];
    const starts = sequence({ boilers: [boiler('one', share)], draws: [draw('main', 360), draw('main', 3_000)] });
    expect(starts.map((s) => [s.firstDrawMin, s.steps[0]?.atMin])).toEqual([
      [360, 215],
      [3_000, 2_855],
    ]);
  });
});

describe('what draws first', () => {
  it('is the warm-up of a machine apart from its run, and nothing that draws no steam', () => {
    const units = [unit('blancher', { headerId: 'main' }), unit('table', { headerId: null })];
    const mode = { unitId: 'blancher', minutes: 60, uses: [], dutyId: null };
    const run = activity('run', {
      modes: [{ ...mode, phases: [phase(0, 15, 500, 'warmUp'), phase(15, 45, 400, 'run')] }],
    });
    const dry = activity('dry', { modes: [{ ...mode, phases: [phase(0, 10, 0, 'run'), phase(10, 5, 90, 'wash')] }] });
    const off = activity('off', { modes: [{ ...mode, unitId: 'table', phases: [phase(0, 10, 100)] }] });
    const model = plant({ units, headers: [header('main')] });
    const found = startUpDraws(model, [
      placedAt(dry, 500),
      placedAt(run, 300),
      placedAt(off, 0, 'table'),
      activity('tray'),
    ]);
    expect(found.map((d) => [d.activityId, d.kind, d.fromMin, d.toMin])).toEqual([
      ['run', 'warmUp', 300, 315],
      ['run', 'steamOn', 315, 360],
      ['dry', 'steamOn', 510, 515],
    ]);
  });
});
