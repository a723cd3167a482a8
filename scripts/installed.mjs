// Exits 0 when node_modules holds what package-lock.json names; else prints the reason and exits 1.
// Plain JavaScript without imports from packages: it runs before there are any.
import { readFileSync } from 'node:fs';

/**
 * @param {string} path
 * @returns {Record<string, { version?: string, integrity?: string, optional?: boolean }> | undefined}
 */
function packagesIn(path) {
  try {
    return JSON.parse(readFileSync(new URL(`../${path}`, import.meta.url), 'utf8')).packages;
  } catch {
    return undefined;
  }
}

function whatIsMissing() {
  const wanted = packagesIn('package-lock.json') ?? {};
  // npm writes this file last, so an install that was cut short has none.
  const present = packagesIn('node_modules/.package-lock.json');
  if (!present) return 'none are installed yet';
  for (const [place, entry] of Object.entries(wanted)) {
    const skipped = place === '' || (entry.optional && !present[place]);
    if (!skipped && present[place]?.version !== entry.version) return `${place.replace(/^node_modules\//, '')} changed`;
  }
  return undefined;
}

const missing = whatIsMissing();
if (missing) {
  process.stdout.write(missing);
  process.exit(1);
}
