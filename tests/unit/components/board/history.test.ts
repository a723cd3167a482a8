import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { EMPTY_HISTORY, forgetEdit, recordEdit, redoStep, undoStep, type History } from '@/components/board/history';
import type { Activity } from '@/core/plant/activity';
import type { Edit } from '@/core/schedule/edit';
import { applyEdit, changeOf, editOf, staleChanges } from '@/core/schedule/edits';
import { activity } from './fixture';

/** A server that counts revisions and refuses what was read from another. */
class Plan {
  activities: readonly Activity[] = ['a', 'b', 'c'].map((id) =>
    activity(id, { placement: { unitId: 'r1', start: 0 } }),
  );
  history: History = EMPTY_HISTORY;

  startOf(id: string): number | undefined {
    return this.activities.find((one) => one.id === id)?.placement?.start;
  }
  save(edit: Edit): void {
    expect(staleChanges(this.activities, edit)).toEqual([]);
    this.activities = applyEdit(this.activities, edit);
  }
  move(id: string, start: number): void {
    const found = this.activities.find((one) => one.id === id) as Activity;
    const edit = editOf('move', [changeOf(found, { placement: { unitId: 'r1', start } })]);
    if (edit.changes.length === 0) return;
    this.save(edit);
    this.history = recordEdit(this.history, edit);
  }
  step(take: typeof undoStep): boolean {
    const step = take(this.history);
    if (!step) return false;
    this.save(step.edit);
    this.history = step.history;
    return true;
  }
}

describe('history', () => {
  it('should take edits of one activity back in turn, each under its newest revision', () => {
    const plan = new Plan();
    plan.move('a', 10);
    plan.move('a', 20);
    plan.step(undoStep);
    expect(plan.startOf('a')).toBe(10);
    plan.step(undoStep);
    expect(plan.startOf('a')).toBe(0);
    plan.step(redoStep);
    plan.step(redoStep);
    expect(plan.startOf('a')).toBe(20);
    expect(plan.step(redoStep)).toBe(false);
  });

  it('should forget what was undone once something new is done', () => {
    const plan = new Plan();
    plan.move('a', 10);
    plan.step(undoStep);
    plan.move('b', 5);
    expect(plan.step(redoStep)).toBe(false);
  });

  it('should drop a refused undo and keep the others', () => {
    const plan = new Plan();
    plan.move('a', 10);
    plan.move('b', 20);
    const step = undoStep(plan.history);
    expect(step).not.toBeNull();
    plan.history = forgetEdit((step as { history: History }).history, (step as { edit: Edit }).edit);
    expect(plan.history.undone).toEqual([]);
    expect(plan.history.done).toHaveLength(1);
    plan.step(undoStep);
    expect([plan.startOf('a'), plan.startOf('b')]).toEqual([0, 20]);
  });

  it('should never send a stale revision of its own making, and end where plain stacks of states end', () => {
    let cases = 0;
    const action = fc.oneof(
      fc.record({
        kind: fc.constant('move' as const),
        id: fc.constantFrom('a', 'b', 'c'),
        start: fc.integer({ min: 0, max: 50 }),
      }),
      fc.record({ kind: fc.constantFrom('undo' as const, 'redo' as const) }),
    );
    fc.assert(
      fc.property(fc.array(action, { maxLength: 40 }), (actions) => {
        cases++;
        const plan = new Plan();
        const starts = (): string => plan.activities.map((one) => one.placement?.start).join();
        const past: string[] = [];
        let future: string[] = [];
        for (const one of actions) {
          const before = starts();
          if (one.kind === 'move') {
            plan.move(one.id, one.start);
            if (starts() !== before) {
              past.push(before);
              future = [];
            }
          } else {
            const [from, to] = one.kind === 'undo' ? [past, future] : [future, past];
            const expected = from.pop();
            expect(plan.step(one.kind === 'undo' ? undoStep : redoStep)).toBe(expected !== undefined);
            if (expected !== undefined) {
              to.push(before);
              expect(starts()).toBe(expected);
            }
          }
        }
      }),
      { numRuns: 300 },
    );
    expect(cases).toBeGreaterThanOrEqual(300);
  });
});
