import { createHash } from 'node:crypto';

/** Stands for what was read: a save that names another than the present one goes over somebody else's change. */
export const readMark = (value: unknown): string =>
  createHash('sha256').update(JSON.stringify(value)).digest('base64url').slice(0, 24);
