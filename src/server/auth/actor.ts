import type { MeDto } from '@/contracts/account';

/** The person signed in, at the plant of the session. */
export interface Actor extends MeDto {
  /** The tablet on the floor that the person signed in at by badge. */
  readonly tabletId?: string;
}

/** What pages and islands may know of an actor. */
export function meDto(actor: Actor): MeDto {
  const { personId, name, plantId, plantName, isDemo, roles } = actor;
  return { personId, name, plantId, plantName, isDemo, roles };
}
