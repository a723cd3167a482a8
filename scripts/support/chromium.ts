import { ensureInstalled, findCommand } from './apt';

/** Chromium's program: $CHROMIUM, or Debian's, which is installed when it is missing and we are root. */
export async function findChromium(): Promise<string> {
  const chosen = process.env['CHROMIUM'];
  return ensureInstalled({
    what: 'Chromium, which the browser tests drive',
    packages: ['chromium'],
    find: () => chosen ?? findCommand('chromium'),
    otherwise: 'Or set CHROMIUM to the path of a Chromium that is there already.',
  });
}
