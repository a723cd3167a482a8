/** The cookie that keeps the theme; written in the browser, read there before the first paint too. */
export const THEME_COOKIE = 'theme';

/** The cookie that an enrolled tablet keeps. */
export const TABLET_COOKIE = 'steadmain_tablet';

const THEMES = ['light', 'dark', 'system'] as const;

/** A cookie's value out of the request's header; null where there is none. */
export function readCookie(header: string | null, name: string): string | null {
  for (const part of header?.split(';') ?? []) {
    const at = part.indexOf('=');
    if (at > 0 && part.slice(0, at).trim() === name) return part.slice(at + 1).trim();
  }
  return null;
}

/** The theme that a person chose on this device; null unless chosen. */
export function themeOf(header: string | null): (typeof THEMES)[number] | null {
  const value = readCookie(header, THEME_COOKIE);
  return THEMES.find((theme) => theme === value) ?? null;
}
