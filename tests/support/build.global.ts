import { buildInto, testDist } from '../../scripts/support/build';

/** Builds the application that the browser tests start, when its sources have changed. */
export default async function setup(): Promise<void> {
  await buildInto(testDist);
}
