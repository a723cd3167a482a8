import { runLevellingWorker } from '@/server/jobs/levellingWorker';
import { startSourceThread } from './sourceThread';

await runLevellingWorker(startSourceThread);
