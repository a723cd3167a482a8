import { describe, expect, it } from 'vitest';
import { canCarry, carryTo, firstTarget, pickUp, putDown, stepCarry } from '@/components/board/carry';
import { layOutRows, LINE_PX, ROW_PX } from '@/components/board/rows';
import { scaleFor } from '@/components/board/timeScale';
import { activity, mode, PLANT } from './fixture';

const rows = layOutRows(PLANT);
const scale = scaleFor('shift', 720, 10_080);
const placed = activity('a', { placement: { unitId: 'r1', start: 400 } });
const at = (x: number, y: number, fine = false) => ({ x, y, fine });
const onR1 = LINE_PX + 10;
const onR2 = LINE_PX + ROW_PX + 10;
const onK1 = 2 * LINE_PX + 2 * ROW_PX + 10;

describe('carrying by hand', () => {
  it('should keep hold of the same place within the activity', () => {
    const carry = carryTo(pickUp(placed, 'hand', 20), at(452, onR1), rows, scale, 5);
    expect(carry.target).toEqual({ unitId: 'r1', start: 430, eligible: true });
  });
  it('should snap to the plant’s minutes, and to the minute when asked', () => {
    const carry = pickUp(placed, 'hand', 0);
    expect(carryTo(carry, at(433, onR2), rows, scale, 5).target).toMatchObject({ unitId: 'r2', start: 435 });
    expect(carryTo(carry, at(433, onR2, true), rows, scale, 5).target?.start).toBe(433);
  });
  it('should work every target out from where it was picked up', () => {
    const far = carryTo(pickUp(placed, 'hand', 20), at(2000, onR2), rows, scale, 5);
    expect(carryTo(far, at(420, onR1), rows, scale, 5).target).toEqual({ unitId: 'r1', start: 400, eligible: true });
  });
  it('should say where an activity can’t run, and not put it down there', () => {
    const carry = carryTo(pickUp(placed, 'hand', 0), at(430, onK1), rows, scale, 5);
    expect(carry.target).toMatchObject({ unitId: 'k1', eligible: false });
    expect(putDown(carry)).toBeNull();
  });
  it('should stay with its unit between rows and be nowhere outside them', () => {
    const carry = carryTo(pickUp(placed, 'hand', 0), at(430, onR2), rows, scale, 5);
    const lineB = LINE_PX + 2 * ROW_PX + 5;
    expect(carryTo(carry, at(450, lineB), rows, scale, 5).target).toMatchObject({ unitId: 'r2', start: 450 });
    expect(carryTo(carry, at(450, -4), rows, scale, 5).target).toBeNull();
  });
  it('should stay within the week', () => {
    expect(carryTo(pickUp(placed, 'hand', 0), at(10_075, onR1), rows, scale, 5).target?.start).toBe(10_020);
  });
});

describe('carrying by keys', () => {
  it('should step by minutes and between units that it can run on', () => {
    const later = stepCarry(pickUp(placed, 'keys'), { minutes: 5 }, rows, 10_080);
    expect(later.target).toEqual({ unitId: 'r1', start: 405, eligible: true });
    const down = stepCarry(later, { units: 1 }, rows, 10_080);
    expect(down.target).toEqual({ unitId: 'r2', start: 405, eligible: true });
    expect(stepCarry(down, { units: 1 }, rows, 10_080).target?.unitId).toBe('r2');
  });
  it('should first hold a waiting activity at its earliest start or now, whichever is later', () => {
    const waiting = activity('w', { modes: [mode('r2', 60)], earliestStart: 362 });
    expect(firstTarget(waiting, 100, 5, 10_080)).toEqual({ unitId: 'r2', start: 365, eligible: true });
    expect(firstTarget(waiting, 501, 5, 10_080).start).toBe(505);
  });
});

describe('putDown', () => {
  it('should change nothing where the activity was', () => expect(putDown(pickUp(placed, 'keys'))).toBeNull());
  it('should give the new place', () => {
    const carry = stepCarry(pickUp(placed, 'keys'), { minutes: -1 }, rows, 10_080);
    expect(putDown(carry)).toEqual({ unitId: 'r1', start: 399 });
  });
});

describe('canCarry', () => {
  it('should leave what the floor has begun, and cleanings that follow, where they are', () => {
    expect(canCarry(activity('a'))).toBe(true);
    expect(canCarry(activity('a', { fixing: 'fixed' }))).toBe(true);
    expect(canCarry(activity('a', { fixing: 'started' }))).toBe(false);
    expect(canCarry(activity('a', { fixing: 'done' }))).toBe(false);
    expect(canCarry(activity('clean:a', { kind: 'cleaning' }))).toBe(false);
    expect(canCarry(activity('warm:a', { kind: 'warmUp' }))).toBe(false);
  });

  it('should take a clean that was planned like any run', () => {
    const clean = activity('c1', { kind: 'cleaning', cleaning: 'wash', stage: null });
    expect(canCarry(clean)).toBe(true);
    expect(canCarry({ ...clean, fixing: 'started' })).toBe(false);
  });
});
