import { describe, expect, it } from 'vitest';
import { clampStart, minuteAt, scaleFor, scrollToSpan, snap, xOf } from '@/components/board/timeScale';

describe('scaleFor', () => {
  it('should fill the view with twelve hours, a day, three days or the week', () => {
    expect(scaleFor('shift', 720, 10_080).pxPerMin).toBe(1);
    expect(scaleFor('day', 720, 10_080).pxPerMin).toBe(0.5);
    expect(scaleFor('threeDays', 864, 10_080).pxPerMin).toBe(0.2);
    expect(scaleFor('week', 1008, 10_080)).toMatchObject({ pxPerMin: 0.1, widthPx: 1008 });
  });

  it('should fill the view with a week that a clock change made longer', () => {
    expect(scaleFor('week', 1014, 10_140).widthPx).toBe(1014);
  });
});

describe('minuteAt', () => {
  const scale = scaleFor('day', 720, 10_080);
  it('should reverse xOf', () => expect(minuteAt(scale, xOf(scale, 4321))).toBe(4321));
  it('should stay within the week', () => {
    expect(minuteAt(scale, -50)).toBe(0);
    expect(minuteAt(scale, 1e6)).toBe(10_080);
  });
});

describe('snap', () => {
  it.each([
    [402, 5, 400],
    [403, 5, 405],
    [402.4, 1, 402],
    [402.6, 0, 403],
    [-2, 5, -0],
  ])('should take %d by %d to %d', (minute, step, expected) => expect(snap(minute, step)).toBe(expected));
});

describe('clampStart', () => {
  it('should keep the whole activity in the week', () => {
    expect(clampStart(-10, 60, 10_080)).toBe(0);
    expect(clampStart(10_050, 60, 10_080)).toBe(10_020);
    expect(clampStart(400, 60, 10_080)).toBe(400);
  });
});

describe('scrollToSpan', () => {
  const view = { left: 1000, width: 600 };
  it('should leave the view where the span is in it', () => {
    expect(scrollToSpan(view, { from: 1100, to: 1200 })).toBe(1000);
  });
  it('should go left to a span before the view, and right to one after it', () => {
    expect(scrollToSpan(view, { from: 500, to: 560 })).toBe(420);
    expect(scrollToSpan(view, { from: 1900, to: 1960 })).toBe(1440);
  });
  it('should show the beginning of a span wider than the view', () => {
    expect(scrollToSpan(view, { from: 1500, to: 2600 })).toBe(1420);
  });
});
