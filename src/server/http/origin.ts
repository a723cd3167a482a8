const SAFE = new Set(['GET', 'HEAD', 'OPTIONS']);

function hostOf(url: string | null | undefined): string | null {
  try {
    return url ? new URL(url).host.toLowerCase() : null;
  } catch {
    return null;
  }
}

/**
 * True where a request may change something: its Origin's host is the Host that it asked for, or the application's own
 * address. Browsers send Origin with every unsafe request, whatever the body's type; only a request without Origin and
 * without cookies, which no browser sends for somebody signed in, passes without.
 */
export function originAllowed(request: Request, appUrl = process.env.APP_URL): boolean {
  if (SAFE.has(request.method)) return true;
  const origin = request.headers.get('origin');
  if (origin === null) return !request.headers.has('cookie');
  const host = hostOf(origin);
  return host !== null && (host === request.headers.get('host')?.toLowerCase() || host === hostOf(appUrl));
}
