import { isDatabaseDown } from './databaseDown';
import type { HttpProblem } from './problem';

const fault: HttpProblem = {
  status: 500,
  code: 'FAULT',
  message: 'Something went wrong on our side; nothing was changed. Try again, then tell your administrator.',
};

const noDatabase: HttpProblem = {
  status: 503,
  code: 'NO-DATABASE',
  message: 'The database does not answer. Wait a minute, look whether your change was saved, and try again.',
};

/** What people are told of an error that nobody expected: never what it says. */
export const faultProblem = (error: unknown): HttpProblem => (isDatabaseDown(error) ? noDatabase : fault);
