import { existsSync, readdirSync } from 'node:fs';
import { dirname, join } from 'node:path';
import { ensureInstalled, findCommand } from '../apt';

const DEBIAN_ROOT = '/usr/lib/postgresql';

/** Debian's folders of server programs, newest version first. */
function debianFolders(): string[] {
  if (!existsSync(DEBIAN_ROOT)) return [];
  const versions = readdirSync(DEBIAN_ROOT).filter((name) => /^\d+$/.test(name));
  return versions.sort((a, b) => Number(b) - Number(a)).map((version) => join(DEBIAN_ROOT, version, 'bin'));
}

/** The folder of initdb, pg_ctl and postgres; installs Debian's package when there is none and we are root. */
export async function findBinaries(): Promise<string> {
  const initdb = await ensureInstalled({
    what: "PostgreSQL's server",
    packages: ['postgresql'],
    find: () => findCommand('initdb', debianFolders()),
  });
  return dirname(initdb);
}

/** The programs that fit a data folder of this major version, or undefined when they are not installed. */
export function binariesOfVersion(version: string, preferred: string): string | undefined {
  const debian = join(DEBIAN_ROOT, version, 'bin');
  if (existsSync(join(debian, 'postgres'))) return debian;
  return preferred.startsWith(DEBIAN_ROOT) ? undefined : preferred;
}
