import { describe, expect, it } from 'vitest';
import { markGone, newMailbox, openMailbox, type MailboxPart, type Side } from '@/solver/mailbox';

const plan = (first: number) => ({ starts: Int32Array.from([first, first + 1]), modes: Int32Array.from([0, 1]) });

function sides(inStep: boolean) {
  const shared = newMailbox(4);
  const part = (side: Side): MailboxPart => ({ shared, side, room: 4, inStep });
  return { part, plan: openMailbox(part(0)), nothing: openMailbox(part(1)) };
}

describe('the mailbox of two searches', () => {
  it('gives the newest plan of the other side, each once, where they are not in step', () => {
    const { plan: a, nothing: b } = sides(false);
    expect(a.startsFrom).toBe('plan');
    expect(b.startsFrom).toBe('nothing');
    expect(a.meet(plan(10))).toBeNull();
    expect(a.meet(plan(20))).toBeNull();
    expect(b.meet(plan(30))).toEqual(plan(20));
    expect(b.meet(plan(40))).toBeNull();
    expect(a.meet(plan(50))).toEqual(plan(40));
  });

  it('gives the last plan of a side that has ended', () => {
    const { plan: a, nothing: b } = sides(false);
    b.meet(plan(1));
    b.close(plan(2));
    expect(a.close(plan(9))).toEqual(plan(2));
  });

  it('does not wait in step for a side that has ended or died', () => {
    const { part, plan: a, nothing: b } = sides(true);
    expect(b.close(plan(7))).toBeNull();
    expect(a.meet(plan(1))).toEqual(plan(7));
    expect(a.close(plan(1))).toEqual(plan(7));
    const other = sides(true);
    markGone(other.part(1));
    expect(other.plan.meet(plan(1))).toBeNull();
    expect(other.plan.close(plan(1))).toBeNull();
    markGone(part(1));
    expect(a.close(plan(1))).toEqual(plan(7));
  });
});
