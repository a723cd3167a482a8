import { ROLE_NAMES, type Role } from '../../contracts/account';

/** What each role is for, beside its box. */
export const ROLE_WORK: Readonly<Record<Role, string>> = {
  planner: 'builds and levels the week, puts it on the floor',
  utilitiesLead: 'says what the boilers can send, agrees to steam over the limit',
  lineSupervisor: 'runs the shift, records what happens on the floor',
  qualityLead: 'releases process data',
  administrator: 'people, tablets, the plant’s settings',
};

/** 'Planner, quality lead' */
export function rolesText(roles: readonly Role[]): string {
  const text = roles.map((role) => ROLE_NAMES[role]).join(', ');
  return text.charAt(0).toUpperCase() + text.slice(1);
}

interface Line {
  readonly id: string;
  readonly name: string;
}

/** 'all lines', or the names of some; lines no longer in use are left out. */
export function linesText(lineIds: readonly string[] | null, lines: readonly Line[]): string {
  if (lineIds === null) return 'all lines';
  const names = lines.filter(({ id }) => lineIds.includes(id)).map(({ name }) => name);
  return names.length === 0 ? 'no line in use' : names.join(', ');
}

/** 'Tue 1 Dec, 06:40' in the plant's zone; `never` for null. */
export function momentText(instant: string | null, timeZone: string, never = 'never'): string {
  if (instant === null) return never;
  const format = new Intl.DateTimeFormat('en-GB', {
    timeZone,
    weekday: 'short',
    day: 'numeric',
    month: 'short',
    hour: '2-digit',
    minute: '2-digit',
    hourCycle: 'h23',
  });
  const parts = Object.fromEntries(format.formatToParts(new Date(instant)).map(({ type, value }) => [type, value]));
  return `${parts.weekday} ${parts.day} ${parts.month}, ${parts.hour}:${parts.minute}`;
}
