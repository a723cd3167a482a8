const DAY_MS = 86_400_000;

/** The date so many days later, as '2026-12-07'. */
export function addDaysTo(date: string, days: number): string {
  return new Date(Date.parse(`${date}T00:00:00Z`) + days * DAY_MS).toISOString().slice(0, 10);
}
