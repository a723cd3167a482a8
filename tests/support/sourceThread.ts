import type { StartThread } from '@/server/levelling/runner';
import { startLevelling } from '@/solver/levellingClient';

const thread = new URL('../../src/server/jobs/thread.ts', import.meta.url).href;
const script = `import('tsx/esm/api').then(({ register }) => (register(), import(${JSON.stringify(thread)})))`;

/** The levelling thread from its sources: a thread does not inherit the loader that reads TypeScript. */
export const startSourceThread: StartThread = (job) => startLevelling(script, job, { eval: true, execArgv: [] });
