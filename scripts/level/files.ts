import { readFile } from 'node:fs/promises';
import type { Problem as Fault, Result } from '../../src/core/result';

/** The value that follows a flag; undefined where the flag is not there. */
export function flag(name: string, args: readonly string[] = process.argv): string | undefined {
  const at = args.indexOf(`--${name}`);
  return at < 0 ? undefined : args[at + 1];
}

/** A flag that must be there, or the sentence that says so and the command's end. */
export function neededFlag(name: string, usage: string): string {
  const value = flag(name);
  if (value === undefined) leave(`--${name} is missing. Usage: ${usage}`);
  return value;
}

/** A whole number from 1 on behind a flag; undefined where the flag is not there. */
export function countFlag(name: string): number | undefined {
  const text = flag(name);
  if (text === undefined) return undefined;
  const value = Number(text);
  if (!Number.isInteger(value) || value < 1) leave(`--${name} must be a whole number from 1 on; it is “${text}”.`);
  return value;
}

/** A file's text, or a sentence that says which file could not be read. */
export async function textOf(file: string): Promise<string> {
  try {
    return await readFile(file, 'utf8');
  } catch (error) {
    return leave(`${file} can't be read: ${error instanceof Error ? error.message : String(error)}`);
  }
}

/** What was read, or every fault of the file with its place and the command's end. */
export function admitted<T>(file: string, read: Result<T, readonly Fault[]>): T {
  if (read.ok) return read.value;
  const lines = read.error.map(({ field, message }) => `  ${field ? `${field}: ` : ''}${message}`);
  return leave([`${file} was not taken:`, ...lines].join('\n'));
}

/** Says why and ends the command with 2: nothing was written. */
export function leave(sentence: string): never {
  console.error(sentence);
  process.exit(2);
}
