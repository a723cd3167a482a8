import { describe, expect, it } from 'vitest';
import { firesOf } from '@/core/house/readiness';
import { startUpSequence } from '@/core/house/startUp';
import { startUpDraws } from '@/core/house/startUpDraws';
import { evaluateWeek } from '@/core/pipeline';
import { stepsFromSpans } from '@/core/time/stepMath';
import { demoWeek } from '@/server/demo/demoWeek';
import { DEMO_BOILERS, DEMO_FIRINGS, DEMO_MAINS, KETTLE_HEADER, MAIN_HEADER } from '@/server/demo/plant';

/** The demo plant is invented; its boilers come up cold after the weekend in 5 + 120 min. */
const week = demoWeek();
const { drawn, headers } = evaluateWeek(week);
const mains = (id: string) => DEMO_MAINS[id] ?? { warmUpMinutes: 0, warmUpKg: 0 };
const starts = (laterByMin: number) =>
  startUpSequence({
    headerId: MAIN_HEADER,
    headers: [
      { id: MAIN_HEADER, fromHeaderId: null, ...mains(MAIN_HEADER) },
      { id: KETTLE_HEADER, fromHeaderId: MAIN_HEADER, ...mains(KETTLE_HEADER) },
    ],
    boilers: DEMO_BOILERS.map((boiler) => {
      const firings = DEMO_FIRINGS.filter(({ boilerId }) => boilerId === boiler.id);
      const spans = firings.map(({ from, to, share }) => ({ from: from + laterByMin, to, value: share }));
      const fires = firesOf(stepsFromSpans(spans, 0), boiler, week.horizonMin);
      return { id: boiler.id, times: boiler, netKgPerH: 1_900, fires };
    }),
    draws: startUpDraws(week.plant, drawn),
    loadKgPerH: headers.find(({ headerId }) => headerId === MAIN_HEADER)?.loadKgPerH ?? [],
    reserveFraction: week.plant.rules.reserveFraction,
  });

describe('the demo week from the weekend on', () => {
  it('starts once, with both mains ready before their first user', () => {
    const [start, ...more] = starts(0);
    expect(more).toEqual([]);
    const at = (kind: string, headerId: string) =>
      start?.steps.find((step) => step.kind === kind && 'headerId' in step && step.headerId === headerId)?.atMin ?? 0;
    const firstOn = (headerId: string) =>
      Math.min(...(start?.steps ?? []).flatMap((s) => ('draw' in s && s.draw.headerId === headerId ? [s.atMin] : [])));
    expect(at('mainsReady', KETTLE_HEADER)).toBe(firstOn(KETTLE_HEADER));
    expect(at('mainsReady', MAIN_HEADER)).toBe(Math.min(firstOn(MAIN_HEADER), at('openMains', KETTLE_HEADER)));
    expect(start?.steps[0]).toMatchObject({ kind: 'light', atMin: at('openMains', MAIN_HEADER) - 125, start: 'cold' });
  });

  it('has its fires lit in time, and would not two hours later', () => {
    expect(starts(0)[0]?.late).toEqual([]);
    const late = starts(120)[0]?.late ?? [];
    expect(late.map(({ boilerId }) => boilerId)).toContain('demo-boiler-1');
    expect(late[0]?.lateMin).toBeGreaterThan(0);
  });
});
