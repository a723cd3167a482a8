import { availableParallelism } from 'node:os';
import { startLevelling } from '@/solver/levellingClient';
import { startMailSender } from '../mail/sender';
import { runLevellingWorker } from './levellingWorker';

// The thread's entry is built apart from this file, to the folder that it lies in.
const thread = new URL('./thread.js', import.meta.url);

const threads = availableParallelism() > 1 ? 2 : 1;

const mail = startMailSender();
await runLevellingWorker(
  (job) => startLevelling(thread, { ...job, threads }),
  () => mail.stop(),
);
