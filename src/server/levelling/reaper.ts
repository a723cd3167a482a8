import { db } from '@/db/client';
import { now } from '../clock';
import { notify } from '../events/notify';
import { failLostRuns } from './runs.repo';

/** Fails runs that nobody works on any more. Any process may call it at any time; each run is failed once. */
export async function reapLostRuns(): Promise<number> {
  return db.transaction(async (tx) => {
    const failed = await failLostRuns(tx, now());
    for (const { id, plantId, planId } of failed) await notify(tx, plantId, { kind: 'levelling', planId, runId: id });
    return failed.length;
  });
}
