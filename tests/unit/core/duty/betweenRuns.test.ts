import { describe, expect, it } from 'vitest';
import { betweenRatesOf, betweenRuns } from '@/core/duty/betweenRuns';
import { steamOfPhases } from '@/core/duty/duty';
import { SHELL_COOLING_DEFAULTS, shellAtSteamOn } from '@/core/duty/shellTemperature';
import { steamBlancher } from '@/core/duty/steamBlancher';
import { stillRetort } from '@/core/duty/stillRetort';
import { shellN } from '../../../verification/dutyExamples';
import { blancherA, retortC, supply } from '../../../verification/dutyWorkedBatches';
import { expectRelative, failureOf, valueOf } from '../../../verification/steamSupport';

/** Idling 75.005 kg/h against 37.949 kg of warming up in 15 min: worked batch A (invented plant). */
describe('a blancher between two runs', () => {
  const rates = valueOf(betweenRatesOf(valueOf(steamBlancher(blancherA, supply))));
  const between = (gapMin: number | null) => valueOf(betweenRuns(gapMin, rates));

  it('breaks even at 30.4 min', () => {
    expectRelative(between(25).breakEvenMin ?? Number.NaN, 30.4, 0.002);
  });

  it('idles through 25 min with 31.25 kg, and no warm-up is charged', () => {
    const idled = between(25);
    expect(idled.choice).toBe('idle');
    expect(idled.phases.map(({ kind, minutes }) => [kind, minutes])).toEqual([['idle', 25]]);
    expectRelative(idled.steamKg, 31.25, 0.0005);
    expect(idled.reason).toBe('Kept hot: idling 31.3 kg, warming up again 37.9 kg.');
  });

  it('is shut for 20 of 35 min and warmed up again in the last 15', () => {
    const rewarmed = between(35);
    expect(rewarmed.choice).toBe('rewarm');
    expect(rewarmed.phases.map(({ kind, minutes }) => [kind, minutes])).toEqual([
      ['idle', 20],
      ['warmUp', 15],
    ]);
    expectRelative(rewarmed.steamKg, 37.949, 1e-5);
  });

  it('changes its mind at the break-even and not before', () => {
    const { breakEvenMin } = between(25);
    expect(between((breakEvenMin ?? 0) - 1e-6).choice).toBe('idle');
    expect(between((breakEvenMin ?? 0) + 1e-6).choice).toBe('rewarm');
  });

  it('warms up for a first run and does nothing without a gap', () => {
    expect(between(null)).toMatchObject({ choice: 'warmUp' });
    expectRelative(between(null).steamKg, 37.949, 1e-5);
    expect(between(0)).toMatchObject({ choice: 'none', phases: [], steamKg: 0 });
  });

  it('idles when there is no time to warm up, however dear', () => {
    const dear = { ...rates, idleKgPerH: 5000 };
    expect(valueOf(betweenRuns(14, dear))).toMatchObject({ choice: 'idle' });
    expect(valueOf(betweenRuns(15, dear))).toMatchObject({ choice: 'rewarm' });
  });

  it('idles for ever when idling is free', () => {
    expect(valueOf(betweenRuns(10_000, { ...rates, idleKgPerH: 0 }))).toMatchObject({
      choice: 'idle',
      breakEvenMin: null,
    });
  });

  it.each([-1, 10_081, Number.NaN])('refuses a gap of %d min', (gapMin) => {
    expect(failureOf(betweenRuns(gapMin, rates))).toMatchObject({ code: 'DUTY-RANGE', field: 'gapMin' });
  });

  it('needs both an idling and a warm-up', () => {
    const noIdle = valueOf(steamBlancher({ ...blancherA, idleMin: 0 }, supply));
    const noWarmUp = valueOf(steamBlancher({ ...blancherA, warmUpMin: 0 }, supply));
    expect(failureOf(betweenRatesOf(noIdle)).message).toContain('idling');
    expect(failureOf(betweenRatesOf(noWarmUp)).message).toContain('warm-up');
  });
});

describe('shell at steam on', () => {
  const shellC = (minutesSinceEnd: number) => valueOf(shellAtSteamOn({ ...shellN, minutesSinceEnd })).shellC;

  it('has a time constant of 90.2 min: 3200 kg x 0.5 kJ/kgK over 14 W/m2K x 21.1115 m2', () => {
    expectRelative(valueOf(shellAtSteamOn(shellN)).timeConstantMin, 1_600_000 / (14 * 21.1115) / 60, 1e-12);
  });

  it('stands at its end temperature at once and at the room’s after a weekend', () => {
    expect(shellC(0)).toBe(40);
    expect(shellC(3600)).toBeCloseTo(25, 9);
    expectRelative(shellC(60), 25 + 15 * Math.exp(-60 / 90.222), 1e-5);
  });

  it('starts a form from figures that work', () => {
    expect(shellAtSteamOn({ ...shellN, ...SHELL_COOLING_DEFAULTS.values }).ok).toBe(true);
  });

  it('spares a second load steam', () => {
    const warm = valueOf(stillRetort({ ...retortC, shellC: shellC(20) }, supply)).steamKg;
    const cold = valueOf(stillRetort({ ...retortC, shellC: shellC(3600) }, supply)).steamKg;
    expect(warm).toBeLessThan(cold);
  });
});

describe('vent in steps', () => {
  const whole = valueOf(stillRetort(retortC, supply));
  const ventOf = (ventSteps: number) =>
    valueOf(stillRetort({ ...retortC, ventSteps }, supply)).phases.filter(({ kind }) => kind === 'vent');

  it('is one even draw unless asked for', () => {
    expect(valueOf(stillRetort({ ...retortC, ventSteps: 1 }, supply))).toEqual(whole);
  });

  it.each([2, 3, 5])('in %d steps keeps kg and minutes of the whole vent', (steps) => {
    const vent = ventOf(steps);
    expect(vent).toHaveLength(steps);
    expectRelative(steamOfPhases(vent), 155.5237, 1e-6);
    expectRelative(
      vent.reduce((sum, { minutes }) => sum + minutes, 0),
      6,
      1e-12,
    );
  });

  /** Metal 65.211 kg at 0.81757 of it, 21.504 kg evenly, 68.809 kg out at 0.35355: by hand. */
  it('draws its metal first and its outflow last: 1767 kg/h, then 1343', () => {
    const [first, second] = ventOf(2).map(({ steamKgPerH }) => steamKgPerH);
    expectRelative(first ?? 0, 20 * (65.2108 * 0.817574 + 21.5036 / 2 + 68.8093 * 0.353553), 1e-4);
    expectRelative(second ?? 0, 20 * (65.2108 * 0.182426 + 21.5036 / 2 + 68.8093 * 0.646447), 1e-4);
    expect(first).toBeGreaterThan(1555.237);
  });

  it.each([0, 11, 2.5, Number.NaN])('refuses %d steps', (ventSteps) => {
    expect(failureOf(stillRetort({ ...retortC, ventSteps }, supply))).toMatchObject({
      code: 'DUTY-RANGE',
      field: 'ventSteps',
    });
  });
});
