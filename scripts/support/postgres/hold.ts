import { existsSync } from 'node:fs';
import pg from 'pg';
import { takeLock } from '../lock';
import { statePath } from '../project';
import { say } from '../say';
import { findBinaries } from './binaries';
import { type Place, knownPlace, makePlace, removePlace } from './place';
import { type RunningServer, databaseUrl, findRunning, startServer, stopServer } from './server';

/** A server that runs at least until it is let go. */
export interface HeldServer {
  /** The address of a database of this server. */
  url(database: string): string;
  /** Whether the server still answers to its process. */
  isRunning(): boolean;
  /** Lets go; the last to do so stops the server, unless it was told to stay. */
  release(): Promise<void>;
  /** Lets go and leaves the server as it is. */
  letGoWithoutStopping(): Promise<void>;
}

/** What a server is for: `postgres` keeps the plant's data, `test-postgres` is made afresh and thrown away. */
export type ServerName = 'postgres' | 'test-postgres';

const keptFile = (name: ServerName): string => statePath(`${name}-kept`);

/**
 * Starts the named server of this project, or shares the one that another of the project's commands runs.
 * One that was left behind by a killed command is taken over, and stopped in the end like one of our own.
 */
export async function holdServer(name: ServerName): Promise<HeldServer> {
  const throwaway = name === 'test-postgres';
  const starting = await takeLock(`${name}-starting`, { wait: true });
  const users = await takeLock(`${name}-users`, { shared: true, wait: true });
  try {
    const bin = await findBinaries();
    const running = await runningOrStarted(name, bin, throwaway);
    return {
      url: (database) => databaseUrl(running, database),
      isRunning: () => findRunning(running.place) !== undefined,
      release: async () => {
        await users?.release();
        await stopIfUnused(name, bin, running.place, throwaway);
      },
      letGoWithoutStopping: async () => users?.release(),
    };
  } catch (error) {
    await users?.release();
    throw error;
  } finally {
    await starting?.release();
  }
}

async function runningOrStarted(name: ServerName, bin: string, throwaway: boolean): Promise<RunningServer> {
  let place = knownPlace(name);
  const running = place && findRunning(place);
  if (running) {
    say(`PostgreSQL runs already, on 127.0.0.1:${running.port}`);
    return running;
  }
  if (place && throwaway) {
    removePlace(name, place);
    place = undefined;
  }
  place ??= makePlace(name);
  const started = await startServer(bin, place, { throwaway });
  say(`PostgreSQL runs on 127.0.0.1:${started.port}, its data in ${place.folder}`);
  return started;
}

async function stopIfUnused(name: ServerName, bin: string, place: Place, throwaway: boolean): Promise<void> {
  const starting = await takeLock(`${name}-starting`, { wait: true });
  const alone = await takeLock(`${name}-users`);
  if (alone && !existsSync(keptFile(name))) {
    await stopServer(bin, place);
    if (throwaway) removePlace(name, place);
  }
  await alone?.release();
  await starting?.release();
}

/** Stops the server where nobody holds it. */
export async function stopUnheld(name: ServerName): Promise<void> {
  const place = knownPlace(name);
  if (place) await stopIfUnused(name, await findBinaries(), place, name === 'test-postgres');
}

/** The path of the file whose presence keeps the server running after the last command has let it go. */
export const keepFile = keptFile;

/** Makes the database when it is not there yet. The name is one of ours, never a person's input. */
export async function ensureDatabase(server: HeldServer, database: string, template = 'template0'): Promise<void> {
  const client = new pg.Client({ connectionString: server.url('postgres') });
  await client.connect();
  try {
    const found = await client.query('select 1 from pg_database where datname = $1', [database]);
    if (found.rowCount === 0) await client.query(`create database "${database}" template "${template}"`);
  } finally {
    await client.end();
  }
}
