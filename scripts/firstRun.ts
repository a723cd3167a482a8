import { closeDb } from '../src/db/client';
import { newFirstRunCode } from '../src/server/people/firstRun.service';

// Prints the one-time code of the first administrator, as long as nobody has an account; otherwise nothing.
const code = await newFirstRunCode();
if (code !== null) console.log(code);
await closeDb();
