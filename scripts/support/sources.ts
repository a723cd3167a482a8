import { createHash } from 'node:crypto';
import { existsSync, readFileSync, readdirSync, statSync } from 'node:fs';
import { join } from 'node:path';
import { projectDir } from './project';

/** Everything the built application is made from. */
const BUILT_FROM = [
  'src',
  'public',
  'astro.config.mjs',
  'tsconfig.json',
  'package-lock.json',
  'scripts/vite.worker.config.ts',
];

function* filesBelow(path: string): Generator<string> {
  if (!existsSync(path)) return;
  if (!statSync(path).isDirectory()) {
    yield path;
    return;
  }
  for (const name of readdirSync(path).sort()) yield* filesBelow(join(path, name));
}

/** One hash over the names and bytes of these files and folders (relative to the project), and Node's version. */
export function hashOf(paths: readonly string[] = BUILT_FROM): string {
  const hash = createHash('sha256').update(process.version);
  for (const path of paths) {
    for (const file of filesBelow(join(projectDir, path))) {
      hash.update(`\0${file.slice(projectDir.length)}\0`).update(readFileSync(file));
    }
  }
  return hash.digest('hex');
}
