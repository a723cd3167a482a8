import { afterEach, beforeEach, expect, it, vi } from 'vitest';
import { now } from '@/server/clock';

beforeEach(() => vi.useFakeTimers({ now: new Date('2026-01-01T00:00:00Z') }));
afterEach(() => {
  vi.unstubAllEnvs();
  vi.useRealTimers();
});

it('is the machine’s unless set', () => {
  vi.stubEnv('STEADMAIN_NOW', '');
  expect(now().toISOString()).toBe('2026-01-01T00:00:00.000Z');
});

it('starts at the instant set and runs on', () => {
  vi.stubEnv('STEADMAIN_NOW', '2026-10-25T00:30:00Z');
  expect(now().toISOString()).toBe('2026-10-25T00:30:00.000Z');
  vi.advanceTimersByTime(90_000);
  expect(now().toISOString()).toBe('2026-10-25T00:31:30.000Z');
});

it('follows a new setting', () => {
  vi.stubEnv('STEADMAIN_NOW', '2026-10-25T00:30:00Z');
  now();
  vi.stubEnv('STEADMAIN_NOW', '2026-03-29T00:59:00Z');
  expect(now().toISOString()).toBe('2026-03-29T00:59:00.000Z');
});

it('refuses what is no instant', () => {
  vi.stubEnv('STEADMAIN_NOW', 'mid-shift');
  expect(() => now()).toThrow('STEADMAIN_NOW');
});
