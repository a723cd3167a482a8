import { describe, expect, it } from 'vitest';
import type { Mode } from '@/core/plant/activity';
import { fail, ok, problem } from '@/core/result';
import { changeWords, reworkedModes, sameModes, type RouteStage } from '@/server/products/reworkedModes';
import { phase } from '../../../support/builders';

const mode = (unitId: string, changes: Partial<Mode> = {}): Mode => {
  return { unitId, minutes: 60, phases: [phase(10, 50, 300)], uses: [], dutyId: 'cook', ...changes };
};
const row = (unitId: string, changes: Partial<RouteStage> = {}): RouteStage => {
  return { stage: 'cook', unitId, dutyId: 'cook', minutes: 0, leadMin: 10, afterMin: 0, uses: [], ...changes };
};
/** A library in which every duty takes 70 minutes. */
const longer = ({ unitId, dutyId, uses }: { unitId: string; dutyId: string | null; uses: Mode['uses'] }) =>
  ok(mode(unitId, { dutyId, uses, minutes: 70, phases: [phase(10, 60, 300)] }));
const crates = (minutes: number) => ({ limitId: 'crates', offsetMin: 0, minutes, amount: 4 });
const operator = { limitId: 'operators', offsetMin: 6, minutes: 8, amount: 1 };

describe('reworkedModes', () => {
  it('takes the library’s mode on each unit and adds units that the route has gained', () => {
    const { modes } = reworkedModes({ modes: [mode('k1')], unitId: 'k1' }, [row('k1'), row('k2')], longer);
    expect(modes.map(({ unitId, minutes }) => [unitId, minutes])).toEqual([
      ['k1', 70],
      ['k2', 70],
    ]);
  });

  it('keeps a unit that the route has lost only while the run is placed on it', () => {
    const run = { modes: [mode('k1'), mode('k2')], unitId: 'k2' };
    expect(reworkedModes(run, [row('k3')], longer).modes.map(({ unitId }) => unitId)).toEqual(['k2', 'k3']);
    expect(reworkedModes({ ...run, unitId: null }, [row('k3')], longer).modes.map((m) => m.unitId)).toEqual(['k3']);
  });

  it('leaves a stage without a duty as long as it was planned, and a run without a route as it is', () => {
    const filler = mode('f1', { dutyId: null, phases: [], minutes: 80 });
    expect(reworkedModes({ modes: [filler], unitId: 'f1' }, [row('f1', { dutyId: null })], longer).modes).toEqual([
      filler,
    ]);
    expect(reworkedModes({ modes: [mode('k1')], unitId: 'k1' }, [], longer).modes).toEqual([mode('k1')]);
  });

  it('lets a use that ran to the end run to the new end', () => {
    const run = { modes: [mode('k1', { uses: [crates(60), operator] })], unitId: 'k1' };
    const { modes } = reworkedModes(run, [row('k1', { uses: [crates(60), operator] })], longer);
    expect(modes[0]?.uses).toEqual([crates(70), operator]);
  });

  it('keeps the mode and says why where the library can’t be worked out', () => {
    const broken = () => fail(problem('DUTY-JACKET', 'Too cold.'));
    const run = { modes: [mode('k1')], unitId: 'k1' };
    expect(reworkedModes(run, [row('k1')], broken)).toEqual({ modes: [mode('k1')], faults: ['Too cold.'] });
  });
});

describe('sameModes', () => {
  it('passes over rounding and what is left out, and sees every other change', () => {
    expect(sameModes([mode('k1')], [mode('k1', { phases: [phase(10, 50, 300 + 1e-8)], warm: undefined })])).toBe(true);
    expect(sameModes([mode('k1')], [mode('k1', { phases: [phase(10, 50, 301)] })])).toBe(false);
    expect(sameModes([mode('k1')], [mode('k1'), mode('k2')])).toBe(false);
    expect(sameModes([mode('k1')], [mode('k1', { neverMoved: true })])).toBe(false);
  });
});

describe('changeWords', () => {
  it('names length, greatest draw and steam, or what else has changed', () => {
    const [was, now] = [mode('k1'), mode('k1', { minutes: 70, phases: [phase(10, 60, 360)] })];
    expect(changeWords([was], [now], 'k1')).toBe('60 to 70 min, 300 to 360 kg/h at most, 250 to 360 kg');
    expect(changeWords([was], [mode('k1', { neverMoved: true })], 'k1')).toContain('after short gaps');
    expect(changeWords([was], [was, mode('k2')], 'k1')).toBe('the units that can do it');
  });
});
