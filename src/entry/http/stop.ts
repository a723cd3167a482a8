import type { Server } from 'node:http';
import type { OpenAnswers } from './streams';

/** How long requests under way may take to finish after the process was asked to stop. */
const GRACE_MS = 5_000;

/** Stops taking connections, ends event streams, lets other requests finish, and ends the process. */
export function stopGracefullyOnSignal(server: Server, answers: OpenAnswers): void {
  const stop = () => {
    server.close(() => process.exit(0));
    server.closeIdleConnections();
    answers.endStreams();
    setTimeout(() => server.closeAllConnections(), GRACE_MS).unref();
  };
  process.once('SIGTERM', stop);
  process.once('SIGINT', stop);
}
