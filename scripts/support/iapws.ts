import { spawnSync } from 'node:child_process';
import { ensureInstalled, findCommand } from './apt';

/** Debian's own Python first: another on the PATH does not see Debian's packages. */
function pythonWithIapws(): string | undefined {
  const candidates = [process.env['IAPWS_PYTHON'], '/usr/bin/python3', findCommand('python3')];
  return candidates.find((python) => python && spawnSync(python, ['-c', 'import iapws']).status === 0);
}

/** A Python that can compute steam with Debian's python3-iapws, which is installed when it is missing and we are root. */
export function findIapwsPython(): Promise<string> {
  return ensureInstalled({
    what: 'python3-iapws, which the steam tables are compared with',
    packages: ['python3-iapws'],
    find: pythonWithIapws,
    otherwise: 'Or set IAPWS_PYTHON to a Python that has the iapws package.',
  });
}
