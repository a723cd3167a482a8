import type { WeekDto } from '../../contracts/week';

/** Where the page keeps the week for the board: a block of JSON is a third of the size of the same as props. */
export const WEEK_DATA_ID = 'week-data';

/** JSON that can stand in a script element: nothing in it ends the element or starts a comment. */
export function asDataBlock(value: unknown): string {
  return JSON.stringify(value).replace(/</g, '\\u003c');
}

/** The week that the page came with; null where it is not there or can't be read. */
export function readWeekBlock(): WeekDto | null {
  const text = document.getElementById(WEEK_DATA_ID)?.textContent;
  if (!text) return null;
  try {
    return JSON.parse(text) as WeekDto;
  } catch {
    return null;
  }
}
