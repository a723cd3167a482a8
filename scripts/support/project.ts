import { existsSync, mkdirSync } from 'node:fs';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';

/** The project's folder, absolute, without a slash at its end. */
export const projectDir = fileURLToPath(new URL('../..', import.meta.url)).replace(/\/$/, '');

/** What the scripts keep between runs (git-ignored). */
export const stateDir = join(projectDir, '.steadmain');

/** A path inside {@link stateDir}, whose folder is made when it is missing. */
export function statePath(...parts: string[]): string {
  mkdirSync(stateDir, { recursive: true });
  return join(stateDir, ...parts);
}

/** Whether the project has this file. */
export const hasFile = (path: string): boolean => existsSync(join(projectDir, path));

/** A failure whose message is all that the person at the terminal needs; it is printed without a stack. */
export class Sentence extends Error {}
