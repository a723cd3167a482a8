import { describe, expect, it } from 'vitest';
import { phasesKg } from '@/core/demand/activityLoad';
import { workMode, type WorkModeInput } from '@/core/demand/workMode';
import type { DutyModel } from '@/core/duty/model';
import { hydrostaticG } from '../../../verification/dutyExamples';
import { blancherA, kettleB, retortC, supply } from '../../../verification/dutyWorkedBatches';
import { expectRelative, failureOf, valueOf } from '../../../verification/steamSupport';

const input = (duty: DutyModel | null, changes: Partial<WorkModeInput> = {}): WorkModeInput => ({
  unitId: 'unit',
  dutyId: 'duty',
  duty,
  supply,
  leadMin: 0,
  afterMin: 0,
  minutes: 0,
  uses: [],
  ...changes,
});
const modeOf = (duty: DutyModel | null, changes: Partial<WorkModeInput> = {}) =>
  valueOf(workMode(input(duty, changes)));
const blancher: DutyModel = { model: 'steamBlancher', inputs: blancherA };
const retort: DutyModel = { model: 'stillRetort', inputs: retortC };

/** Worked batch A (invented plant): 15 min of warming up with 37.949 kg, idling 75.005 kg/h: even at 30.4 min. */
describe('a blancher that can idle', () => {
  const mode = modeOf(blancher);

  it('runs without its warm-up and idling', () => {
    expect(mode.phases.map(({ kind, offsetMin, minutes }) => [kind, offsetMin, minutes])).toEqual([['run', 0, 120]]);
    expect(mode.minutes).toBe(120);
  });

  it('warms up and idles between runs', () => {
    expect(mode.between?.warmUp.map(({ kind, offsetMin, minutes }) => [kind, offsetMin, minutes])).toEqual([
      ['warmUp', 0, 15],
    ]);
    expectRelative(phasesKg(mode.between?.warmUp ?? []), 37.949, 1e-5);
    expectRelative(mode.between?.idleKgPerH ?? 0, 75.0049, 1e-5);
    expect(mode.between?.idleUpToMin).toBe(30);
  });

  it('idles while there is no time to warm up, however dear', () => {
    const dear = modeOf({ model: 'steamBlancher', inputs: { ...blancherA, idleEscapeKgPerH: 900 } });
    expect(dear.between?.idleUpToMin).toBe(14);
  });

  it('has its warm-up in the run where no idling is entered', () => {
    const plain = modeOf({ model: 'steamBlancher', inputs: { ...blancherA, idleMin: 0 } });
    expect(plain.between).toBeUndefined();
    expect(plain.phases.map(({ kind }) => kind)).toEqual(['warmUp', 'run']);
    expect(plain.minutes).toBe(135);
  });
});

describe('a retort load', () => {
  const mode = modeOf(retort, { leadMin: 8, afterMin: 6 });

  it('vents after loading and frees the retort after unloading', () => {
    expect(mode.phases[0]).toMatchObject({ kind: 'vent', offsetMin: 8, minutes: 6 });
    expect(mode.minutes).toBe(8 + 50 + 6);
    expect(mode.between).toBeUndefined();
  });

  it('takes less steam the shorter the gap, always less than cold', () => {
    const warm = mode.warm ?? [];
    const kg = [...warm.map(({ phases }) => phasesKg(phases)), phasesKg(mode.phases)];
    expect(warm.map(({ gapUpToMin }) => gapUpToMin)).toEqual([15, 30, 60, 120]);
    expect(kg).toEqual([...kg].sort((a, b) => a - b));
    expect(new Set(kg).size).toBe(kg.length);
  });

  it('takes the shell as it is at the longest gap of a class', () => {
    // 3200 kg of steel over 21.11 m2 at 14 W/m2K: 40 degC falls to 36.3 in 6 + 15 + 8 min; 11.3 K of 3200 kg less.
    const lessKJ = 3200 * 0.5 * (25 + 15 * Math.exp(-29 / 90.22) - 25);
    const less = phasesKg(mode.phases) - phasesKg(mode.warm?.[0]?.phases ?? []);
    expect(less).toBeGreaterThan((0.9 * lessKJ) / 2300);
    expect(less).toBeLessThan((1.1 * lessKJ) / 2200);
  });

  it('is cold after any gap where the shell is entered as warm already', () => {
    const inputs = { ...retortC, shellC: 45 };
    expect(modeOf({ model: 'stillRetort', inputs }).warm).toBeUndefined();
  });
});

describe('other duties', () => {
  it("leaves a kettle's heat-up of the product in the run", () => {
    const mode = modeOf({ model: 'jacketedKettle', inputs: kettleB }, { leadMin: 10 });
    expect(mode.phases[0]).toMatchObject({ kind: 'heatUp', offsetMin: 10 });
    expect(mode.between).toBeUndefined();
  });

  it('keeps a typed profile as it is typed, without a header too', () => {
    const phases = [
      { kind: 'warmUp', minutes: 5, steamKgPerH: 100 },
      { kind: 'idle', minutes: 5, steamKgPerH: 10 },
    ] as const;
    const mode = modeOf({ model: 'typed', inputs: { phases, source: 'meter' } }, { supply: null, minutes: 30 });
    expect(mode.phases.map(({ kind }) => kind)).toEqual(['warmUp', 'idle']);
    expect(mode).toMatchObject({ minutes: 30 });
    expect(mode.between).toBeUndefined();
  });

  it('draws nothing without a duty', () => {
    expect(modeOf(null, { minutes: 40, dutyId: null })).toMatchObject({ phases: [], minutes: 40, dutyId: null });
  });

  it('marks a continuous cooker as never moved and warms it up for hours before', () => {
    const mode = modeOf({ model: 'continuousCooker', inputs: hydrostaticG });
    expect(mode.neverMoved).toBe(true);
    expect(mode.phases.map(({ kind }) => kind)).toEqual(['run']);
    expect(mode.between?.warmUp[0]).toMatchObject({ kind: 'heatUp', offsetMin: 0 });
  });
});

describe('what a mode is refused for', () => {
  it('says that steam needs a header', () => {
    expect(failureOf(workMode(input(blancher, { supply: null }))).code).toBe('MODE-SUPPLY');
  });

  it.each([['leadMin', 1.5] as const, ['afterMin', -1] as const, ['minutes', Number.NaN] as const])(
    'wants whole minutes in %s',
    (field, value) => {
      expect(failureOf(workMode(input(retort, { [field]: value })))).toMatchObject({ code: 'MODE-MINUTES', field });
    },
  );

  it("passes the duty's own problem on", () => {
    const bad: DutyModel = { model: 'steamBlancher', inputs: { ...blancherA, productKgPerH: -1 } };
    expect(failureOf(workMode(input(bad)))).toMatchObject({ code: 'DUTY-RANGE', field: 'productKgPerH' });
  });
});
