import { randomUUID } from 'node:crypto';

/** A random id for a new row. */
export const newId = (): string => randomUUID();
