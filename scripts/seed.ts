import { closeDb, db } from '../src/db/client';
import { now } from '../src/server/clock';
import { DEMO_PASSWORD, DEMO_PEOPLE } from '../src/server/demo/people';
import { seedDemo } from '../src/server/demo/seed';

/** Prints who can sign in to the demo plant. */
function printPeople(): void {
  for (const person of DEMO_PEOPLE)
    console.log(`  ${person.email.padEnd(34)} ${person.name} (${person.roles.join(', ')})`);
  console.log(`  password for all of them: ${DEMO_PASSWORD}`);
}

if (process.argv.includes('--print-people')) printPeople();
else {
  console.log(await seedDemo(db, now()));
  await closeDb();
}
