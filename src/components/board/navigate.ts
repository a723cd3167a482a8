import type { Drawn } from './drawn';

export type Direction = 'left' | 'right' | 'up' | 'down' | 'first' | 'last';

/**
 * The block that the focus goes to from one block: along its unit, or to the block of the next unit with any that is
 * nearest in time. null where there is none.
 */
export function neighbourOf(
  byUnit: ReadonlyMap<string, readonly Drawn[]>,
  unitIds: readonly string[],
  fromId: string,
  direction: Direction,
): string | null {
  const rows = unitIds.map((id) => byUnit.get(id) ?? []);
  const row = rows.findIndex((list) => list.some((drawn) => drawn.activity.id === fromId));
  const here = rows[row];
  if (!here) return rows.flat()[0]?.activity.id ?? null;
  const at = here.findIndex((drawn) => drawn.activity.id === fromId);
  switch (direction) {
    case 'left':
      return here[at - 1]?.activity.id ?? null;
    case 'right':
      return here[at + 1]?.activity.id ?? null;
    case 'first':
      return here[0]?.activity.id ?? null;
    case 'last':
      return here.at(-1)?.activity.id ?? null;
    default:
      return inNextRow(rows, row, middleOf(here[at] as Drawn), direction === 'up' ? -1 : 1);
  }
}

const middleOf = (drawn: Drawn): number => drawn.start + drawn.minutes / 2;

function inNextRow(rows: readonly (readonly Drawn[])[], row: number, middle: number, by: 1 | -1): string | null {
  for (let i = row + by; i >= 0 && i < rows.length; i += by) {
    const list = rows[i] as readonly Drawn[];
    if (list.length === 0) continue;
    const nearest = list.reduce((a, b) => (Math.abs(middleOf(b) - middle) < Math.abs(middleOf(a) - middle) ? b : a));
    return nearest.activity.id;
  }
  return null;
}
