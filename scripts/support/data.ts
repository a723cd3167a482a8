import { Sentence, hasFile } from './project';
import { cleanEnv, runTs } from './run';

const MIGRATE = 'src/db/migrate.ts';
const SEED = 'scripts/seed.ts';
const FIRST_RUN = 'scripts/firstRun.ts';

async function onDatabase(file: string, args: string[], env: Record<string, string | undefined>): Promise<string> {
  if (!hasFile(file)) return '';
  const { code, output } = await runTs(file, args, { capture: true, env: cleanEnv(env) });
  if (code !== 0) throw new Sentence(`${file} failed:\n${output.trim().split('\n').slice(-25).join('\n')}`);
  return output;
}

/** Brings the database's tables up to date. */
export const migrate = (databaseUrl: string): Promise<string> => onDatabase(MIGRATE, [], { DATABASE_URL: databaseUrl });

/** Puts the demo plant into the database, if it is not there yet. `now` is an ISO instant; without it, the clock's. */
export const seedDemo = (databaseUrl: string, now?: string): Promise<string> =>
  onDatabase(SEED, [], { DATABASE_URL: databaseUrl, ...(now ? { STEADMAIN_NOW: now } : {}) });

/** The demo people and their password, as the seed prints them. */
export const demoPeople = (databaseUrl: string): Promise<string> =>
  onDatabase(SEED, ['--print-people'], { DATABASE_URL: databaseUrl });

/** The one-time code of the first administrator; empty where somebody has an account. */
export const firstRunCode = async (databaseUrl: string): Promise<string> =>
  (await onDatabase(FIRST_RUN, [], { DATABASE_URL: databaseUrl })).trim();
