/** What happens on the floor, in the order of a retort's cycle; other units use the first and the last. */
export const FLOOR_EVENTS = [
  'cratesIn',
  'steamOn',
  'ventsClosed',
  'timingStarted',
  'steamOff',
  'cooled',
  'empty',
] as const;

export type FloorEventKind = (typeof FLOOR_EVENTS)[number];
