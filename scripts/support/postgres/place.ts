import { spawnSync } from 'node:child_process';
import { chownSync, existsSync, lstatSync, mkdirSync, mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { userNamed } from '../apt';
import { Sentence, statePath } from '../project';
import { say } from '../say';

/** Who runs the server and owns its files. */
export interface Owner {
  readonly uid: number;
  readonly gid: number;
}

/** A folder that holds one server's data, log and marker, and its owner. */
export interface Place {
  readonly folder: string;
  readonly owner: Owner;
}

/** PostgreSQL refuses to run as root: then an unprivileged system user does it. */
function defaultOwner(): Owner {
  const uid = process.getuid?.() ?? 0;
  if (uid !== 0) return { uid, gid: process.getgid?.() ?? uid };
  const user = userNamed('postgres') ?? userNamed('nobody');
  if (!user)
    throw new Sentence('PostgreSQL can’t run as root, and there is no user "postgres" or "nobody" to run it as.');
  return user;
}

/** spawn's options for acting as the owner; a change of user is only possible, and only needed, as root. */
export function asOwner(owner: Owner): { cwd: string; uid?: number; gid?: number } {
  return process.getuid?.() === 0 ? { cwd: '/', ...owner } : { cwd: '/' };
}

function canUse(folder: string, owner: Owner): boolean {
  return spawnSync('/usr/bin/test', ['-w', folder, '-a', '-x', folder], asOwner(owner)).status === 0;
}

function ownerOf(folder: string): Owner | undefined {
  const stat = lstatSync(folder, { throwIfNoEntry: false });
  return stat?.isDirectory() ? { uid: stat.uid, gid: stat.gid } : undefined;
}

function checkOwner(folder: string, owner: Owner): Place {
  const ourUid = process.getuid?.() ?? 0;
  if (owner.uid === 0 || (ourUid !== 0 && owner.uid !== ourUid)) {
    throw new Sentence(
      `The database in ${folder} belongs to another user (id ${owner.uid}). Run this as that user or as root, ` +
        'or remove that folder to begin with a fresh database.',
    );
  }
  return { folder, owner };
}

/** The place kept from an earlier run, if its folder still stands. */
export function knownPlace(name: string): Place | undefined {
  const note = statePath(`${name}-place`);
  const noted = existsSync(note) ? readFileSync(note, 'utf8').trim() : undefined;
  const folder = noted ?? statePath(name);
  const owner = ownerOf(folder);
  if (owner) return checkOwner(folder, owner);
  if (noted) {
    say(`The database was in ${noted}, which has gone (temporary files are often emptied at a restart)`);
    say('Making a new one, with a new demo plant; nothing of the old one is left');
    rmSync(note);
  }
  return undefined;
}

/** Makes a folder for a server: in the project, or among the temporary files where its user can't reach the project. */
export function makePlace(name: string): Place {
  const owner = defaultOwner();
  const inside = statePath(name);
  mkdirSync(inside, { mode: 0o700 });
  if (process.getuid?.() === 0) chownSync(inside, owner.uid, owner.gid);
  if (canUse(inside, owner)) return { folder: inside, owner };
  rmSync(inside, { recursive: true });
  for (const base of new Set([tmpdir(), '/tmp', '/var/tmp'])) {
    const outside = mkdtempSync(join(base, `steadmain-${name}-`));
    chownSync(outside, owner.uid, owner.gid);
    if (canUse(outside, owner)) {
      writeFileSync(statePath(`${name}-place`), `${outside}\n`);
      return { folder: outside, owner };
    }
    rmSync(outside, { recursive: true });
  }
  throw new Sentence(`User ${owner.uid}, who runs PostgreSQL, can write neither in this project nor in /tmp.`);
}

/** Removes a place and its note. */
export function removePlace(name: string, place: Place): void {
  rmSync(place.folder, { recursive: true, force: true });
  rmSync(statePath(`${name}-place`), { force: true });
}
