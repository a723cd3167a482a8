import { ROLE_NAMES, ROLES, type Role } from '@/contracts/account';
import { fail, ok, problem, type Result } from '@/core/result';
import type { Actor } from './actor';

/** Who may do what at a plant: the only such table. */
export const PERMISSIONS = {
  'account.own': ROLES,
  'plant.follow': ROLES,
  'plan.read': ROLES,
  'plan.edit': ['planner'],
  'plan.level': ['planner'],
  'plan.issue': ['planner'],
  'steam.agree': ['utilitiesLead'],
  'capacity.read': ROLES,
  'capacity.set': ['utilitiesLead'],
  'plant.read': ROLES,
  'plant.edit': ['utilitiesLead', 'administrator'],
  'library.read': ROLES,
  'library.edit': ['planner', 'utilitiesLead', 'administrator'],
  'practice.read': ROLES,
  'practice.enter': ['planner', 'utilitiesLead', 'administrator'],
  'practice.release': ['qualityLead'],
  'settings.own': ROLES,
  'settings.plant': ['administrator'],
  'floor.read': ROLES,
  'floor.record': ['lineSupervisor'],
  'processData.read': ROLES,
  'processData.release': ['qualityLead'],
  'people.manage': ['administrator'],
  'tablets.manage': ['administrator'],
  'mail.read': ['administrator'],
} as const satisfies Record<string, readonly Role[]>;

export type Permission = keyof typeof PERMISSIONS;

export { ROLE_NAMES };

/** What a session by badge is not for, whoever holds it: the account itself. */
const NOT_AT_TABLETS: ReadonlySet<Permission> = new Set(['account.own', 'settings.own']);

/** The roles that a session by badge carries, of those that the person holds. */
export const FLOOR_ROLES: readonly Role[] = PERMISSIONS['floor.record'];

declare const checked: unique symbol;

/** An actor found to hold a permission. Only `authorize` makes one, so a forgotten check does not compile. */
export type Authorized<P extends Permission> = Actor & { readonly [checked]: { readonly [K in P]: true } };

/** True where one of the actor's roles carries the permission. */
export function may(actor: Pick<Actor, 'roles' | 'tabletId'>, permission: Permission): boolean {
  if (actor.tabletId && NOT_AT_TABLETS.has(permission)) return false;
  const roles: readonly Role[] = PERMISSIONS[permission];
  return actor.roles.some((role) => roles.includes(role));
}

/** The actor as one who holds the permission; a refusal names the roles that do. */
export function authorize<P extends Permission>(actor: Actor, permission: P): Result<Authorized<P>> {
  if (may(actor, permission)) return ok(actor as Authorized<P>);
  if (actor.tabletId && NOT_AT_TABLETS.has(permission)) {
    return fail(problem('TABLET', 'This is not done at a shared tablet. Sign in with your e-mail address elsewhere.'));
  }
  const names = PERMISSIONS[permission].map((role) => ROLE_NAMES[role]).join(' or ');
  return fail(
    problem('ROLE', `Only ${names.startsWith('a') ? 'an' : 'a'} ${names} of ${actor.plantName} may do this.`),
  );
}
