import { TABLET_COOKIE } from './cookies';

/** The longest that browsers keep a cookie: 400 days. */
const KEPT_SECONDS = 400 * 24 * 3_600;

/** The cookie that keeps a device enrolled; scripts never see it. */
export function tabletCookie(token: string, appUrl = process.env.APP_URL): string {
  const secure = appUrl?.startsWith('https:') ? '; Secure' : '';
  return `${TABLET_COOKIE}=${token}; Path=/; Max-Age=${KEPT_SECONDS}; HttpOnly; SameSite=Lax${secure}`;
}
