import { accessSync, constants, mkdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { delimiter, join } from 'node:path';
import { Sentence, statePath } from './project';
import { run } from './run';
import { say } from './say';

/** Something of Debian's that the project needs. */
export interface SystemNeed {
  /** As said to a person: "PostgreSQL's server". */
  readonly what: string;
  readonly packages: readonly string[];
  /** Where it is, if it is there. */
  readonly find: () => string | undefined;
  /** Named when it can't be installed: another way to point at it. */
  readonly otherwise?: string;
}

/** Finds a command on the PATH or in the folders given. */
export function findCommand(name: string, folders: readonly string[] = []): string | undefined {
  const places = [...folders, ...(process.env['PATH'] ?? '').split(delimiter), '/usr/bin', '/usr/local/bin'];
  return places.map((folder) => join(folder, name)).find(isExecutable);
}

function isExecutable(path: string): boolean {
  try {
    accessSync(path, constants.X_OK);
    return true;
  } catch {
    return false;
  }
}

/** Finds what is needed; as root on Debian installs it first. Otherwise says what to install. */
export async function ensureInstalled(need: SystemNeed): Promise<string> {
  const before = need.find();
  if (before) return before;
  const command = `apt-get install -y --no-install-recommends ${need.packages.join(' ')}`;
  if (process.getuid?.() !== 0 || !findCommand('apt-get')) {
    throw new Sentence(
      `${need.what} is not installed. As root, run:\n  apt-get update && ${command}\n` +
        `then run this again.${need.otherwise ? ` ${need.otherwise}` : ''}`,
    );
  }
  say(`Installing ${need.what} from Debian's packages (${need.packages.join(', ')})`);
  await withoutDefaultCluster(() => install(need.packages));
  const after = need.find();
  if (!after) throw new Sentence(`${need.what} was installed but can't be found. ${need.otherwise ?? ''}`);
  return after;
}

async function install(packages: readonly string[]): Promise<void> {
  const env = { ...process.env, DEBIAN_FRONTEND: 'noninteractive' };
  const steps = [['update'], ['install', '-y', '--no-install-recommends', ...packages]];
  let log = '';
  for (const args of steps) {
    const { code, output } = await run('apt-get', args, { capture: true, env });
    log += output;
    writeFileSync(statePath('apt.log'), log);
    if (code !== 0) {
      throw new Sentence(`apt-get ${args[0]} failed:\n${output.trim().split('\n').slice(-12).join('\n')}`);
    }
  }
}

/**
 * Debian's package makes and starts a database cluster of its own the first time it is installed. Nobody asked for
 * that one here, so it is switched off for the length of this installation, in a drop-in that is taken away again.
 */
async function withoutDefaultCluster(work: () => Promise<void>): Promise<void> {
  const folder = '/etc/postgresql-common/createcluster.d';
  const dropIn = join(folder, 'zz-steadmain.conf');
  mkdirSync(folder, { recursive: true });
  writeFileSync(dropIn, 'create_main_cluster = false\n');
  try {
    await work();
  } finally {
    rmSync(dropIn, { force: true });
  }
}

/** The id of a system user, or undefined where there is none of that name. */
export function userNamed(name: string): { uid: number; gid: number } | undefined {
  const line = readFileSync('/etc/passwd', 'utf8')
    .split('\n')
    .find((entry) => entry.startsWith(`${name}:`));
  const [, , uid, gid] = line?.split(':') ?? [];
  return uid && gid ? { uid: Number(uid), gid: Number(gid) } : undefined;
}
