import { hash, verify } from '@node-rs/argon2';
import { newId } from '../id';

/** OWASP's smallest advised setting for argon2id: 19 MiB, 2 passes, 1 lane. */
const COST = { memoryCost: 19_456, timeCost: 2, parallelism: 1 };

let decoy: Promise<string> | null = null;

/** argon2id of a password, as stored. */
export const hashPassword = (password: string): Promise<string> => hash(password, COST);

/**
 * True where the password belongs to the hash. Without a hash (unknown person, no password set) the same work is done
 * on a decoy, so that the time taken tells nothing.
 */
export async function verifyPassword(stored: string | null | undefined, password: string): Promise<boolean> {
  decoy ??= hashPassword(newId());
  const against = stored ?? (await decoy);
  const matches = await verify(against, password);
  return matches && stored != null;
}
