import { describe, expect, it } from 'vitest';
import { firstPage } from '@/components/account/firstPage';
import {
  APART,
  BY_HABIT,
  DRAWN_LIMIT_KG_PER_H,
  drawnLoad,
  furthestMove,
  minutesOver,
} from '@/components/account/ventsDrawn';

describe('firstPage', () => {
  it('is the page that a role works on', () => {
    expect(firstPage(['planner'])).toBe('/week');
    expect(firstPage(['utilitiesLead'])).toBe('/capacity');
    expect(firstPage(['lineSupervisor'])).toBe('/shift');
    expect(firstPage(['qualityLead'])).toBe('/week');
  });

  it('is the widest of several roles in any order', () => {
    expect(firstPage(['lineSupervisor', 'utilitiesLead', 'planner'])).toBe('/week');
  });
});

describe('the drawing beside the sign-in form', () => {
  it('shows the same steam, over the limit by habit and never apart', () => {
    const habit = drawnLoad(BY_HABIT);
    const apart = drawnLoad(APART);
    const sum = (load: readonly number[]): number => load.reduce((a, b) => a + b, 0);
    expect(sum(apart)).toBe(sum(habit));
    expect(minutesOver(habit)).toBeGreaterThan(20);
    expect(Math.max(...apart)).toBeLessThanOrEqual(DRAWN_LIMIT_KG_PER_H);
    expect(furthestMove(BY_HABIT, APART)).toBeLessThanOrEqual(12);
  });
});
