import type { MeDto, Role } from '@/contracts/account';

/** The person signed in, at the plant of the session. */
export interface Actor {
  readonly personId: string;
  readonly name: string;
  readonly plantId: string;
  readonly plantName: string;
  readonly isDemo: boolean;
  readonly roles: readonly Role[];
}

/** What pages and islands may know of an actor. */
export function meDto(actor: Actor): MeDto {
  const { personId, name, plantId, plantName, isDemo, roles } = actor;
  return { personId, name, plantId, plantName, isDemo, roles };
}
