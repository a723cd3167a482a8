import { buildInto, startDist } from './support/build';
import { runCommand } from './support/finish';

await runCommand(async () => {
  await buildInto(startDist);
  return 0;
});
