import { useStore, type Store } from './store';
import type { Carrying } from './useCarry';

/** What the hand holds, while it is over no unit; over a unit the landing shows it. */
export function CarriedChip({ carried }: { readonly carried: Store<Carrying | null> }) {
  const carry = useStore(carried, (c) => c?.carry ?? null);
  if (!carry || carry.target) return null;
  return (
    <div className="float w-max px-2 py-1 text-xs font-medium">
      {carry.activity.title} <span className="font-normal text-ink-muted">{carry.activity.code}</span>
    </div>
  );
}
