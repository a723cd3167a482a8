import type { Role } from '@/contracts/account';

/** The page that a person's work starts on; with several roles, the one that sees the most of the week. */
export function firstPage(roles: readonly Role[]): string {
  if (roles.includes('planner')) return '/week';
  if (roles.includes('utilitiesLead')) return '/capacity';
  if (roles.includes('lineSupervisor')) return '/shift';
  return '/week';
}
