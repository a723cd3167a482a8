import { chownSync, existsSync, readFileSync, readdirSync, renameSync, writeFileSync } from 'node:fs';
import { randomBytes } from 'node:crypto';
import { join } from 'node:path';
import { Sentence } from '../project';
import type { Place } from './place';

/** The file that says a database is ours, beside its data. Without it we touch nothing. */
export interface Marker {
  readonly madeBy: 'steadmain';
  readonly port: number;
  readonly password: string;
  /** False until the data folder is whole: one that was cut short is made again. */
  readonly ready: boolean;
}

const markerPath = (place: Place): string => join(place.folder, 'steadmain.json');

/** The marker of a place; a new one for an empty folder; a refusal for a folder that holds something else. */
export function readMarker(place: Place): Marker {
  if (existsSync(markerPath(place))) return JSON.parse(readFileSync(markerPath(place), 'utf8')) as Marker;
  if (readdirSync(place.folder).length > 0) {
    throw new Sentence(
      `${place.folder} holds files that Steadmain did not make, so it leaves them alone. Move that folder away first.`,
    );
  }
  return { madeBy: 'steadmain', port: 0, password: randomBytes(24).toString('base64url'), ready: false };
}

/** Writes the marker whole or not at all, readable by its owner only. */
export function writeMarker(place: Place, marker: Marker): void {
  const draft = `${markerPath(place)}.new`;
  writeFileSync(draft, JSON.stringify(marker, null, 2), { mode: 0o600 });
  if (process.getuid?.() === 0) chownSync(draft, place.owner.uid, place.owner.gid);
  renameSync(draft, markerPath(place));
}
