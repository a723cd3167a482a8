/** Pages that people see before they have signed in. */
const OPEN_PAGES = new Set([
  '/sign-in',
  '/first-run',
  '/invitation/[token]',
  '/reset',
  '/reset/[token]',
  '/tablet',
  '/404',
  '/500',
]);

const withoutSlash = (path: string): string => (path.length > 1 ? path.replace(/\/+$/, '') : path);

/** True for what is a page and wants somebody signed in; endpoints refuse for themselves. */
export function needsSignIn(path: string, routePattern: string): boolean {
  if (path.startsWith('/api/') || path.startsWith('/_')) return false;
  return !OPEN_PAGES.has(withoutSlash(path)) && !OPEN_PAGES.has(routePattern);
}

/** Where to sign in and come back to. */
export function signInAddress(url: URL): string {
  const next = url.pathname + url.search;
  return next === '/' ? '/sign-in' : `/sign-in?next=${encodeURIComponent(next)}`;
}

/** The page to go to after signing in: within the application, whatever the address bar says. */
export function safeNext(next: string | null | undefined): string {
  if (!next?.startsWith('/')) return '/';
  const base = 'http://here.invalid';
  let url: URL;
  try {
    url = new URL(next, base);
  } catch {
    return '/';
  }
  return url.origin === base && !url.pathname.startsWith('//') ? url.pathname + url.search + url.hash : '/';
}
