import type { Fixing } from '../../core/plant/activity';

const SHAPES: Readonly<Record<Exclude<Fixing, 'free'>, string>> = {
  /** A padlock. */
  fixed: 'M2 5h8v6H2zM3.4 5V3.6a2.6 2.6 0 0 1 5.2 0V5H7.2V3.7a1.2 1.2 0 0 0-2.4 0V5z',
  /** Running. */
  started: 'M3 1.5 10.5 6 3 10.5z',
  /** Done. */
  done: 'M1.2 6.2 2.8 4.6 4.9 6.7 9.4 2.2 11 3.8 4.9 9.9z',
};

/** A steady draw: levelling and slipping leave it where it is. */
const STEADY = 'M1 2.8h10v2.2H1zM1 7h10v2.2H1z';

/** Fixed, started, done and never moved told apart by shape. */
export function FixingMark({
  fixing,
  neverMoved = false,
  className = 'batch-mark',
}: {
  readonly fixing: Fixing;
  readonly neverMoved?: boolean;
  readonly className?: string;
}) {
  if (fixing === 'free' && !neverMoved) return null;
  return (
    <svg className={className} viewBox="0 0 12 12" aria-hidden="true" focusable="false">
      <path d={fixing === 'free' ? STEADY : SHAPES[fixing]} />
    </svg>
  );
}
