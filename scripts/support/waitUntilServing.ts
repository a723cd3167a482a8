import { Sentence } from './project';

const PATIENCE_MS = 60_000;

/** Waits until the address answers with success. */
export async function waitUntilServing(url: string): Promise<void> {
  const until = Date.now() + PATIENCE_MS;
  while (Date.now() < until) {
    const answer = await fetch(url).catch(() => undefined);
    if (answer?.ok) return;
    await new Promise((resolve) => setTimeout(resolve, 100));
  }
  throw new Sentence(
    `The web process did not answer at ${url} within ${PATIENCE_MS / 1000} seconds; see its lines above.`,
  );
}
