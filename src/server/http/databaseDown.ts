/** What connections fail with while a database is down, starting, stopping or out of reach. */
const CODES = new Set([
  'ECONNREFUSED',
  'ECONNRESET',
  'EHOSTUNREACH',
  'ENETUNREACH',
  'ENOTFOUND',
  'EPIPE',
  'ETIMEDOUT',
  '08000',
  '08003',
  '08006',
  '53300',
  '57P01',
  '57P02',
  '57P03',
]);
const MESSAGES = /connection terminated|timeout exceeded when trying to connect|connection timeout/i;

/** True where an error, or what caused it, says that the database can't be reached. */
export function isDatabaseDown(error: unknown): boolean {
  if (!(error instanceof Error)) return false;
  if ('code' in error && CODES.has(String(error.code))) return true;
  return MESSAGES.test(error.message) || isDatabaseDown(error.cause);
}
