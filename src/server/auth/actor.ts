import type { MeDto } from '@/contracts/account';

/** The person signed in, at the plant of the session. */
export type Actor = MeDto;

/** What pages and islands may know of an actor. */
export function meDto(actor: Actor): MeDto {
  const { personId, name, plantId, plantName, isDemo, roles } = actor;
  return { personId, name, plantId, plantName, isDemo, roles };
}
