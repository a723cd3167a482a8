/**
 * What a part of a path names: the built server leaves a coded colon as it is, as `warm%3A` for `warm:`. Empty for what
 * can't be read.
 */
export function namedBy(part: string | undefined): string {
  try {
    return decodeURIComponent(part ?? '');
  } catch {
    return '';
  }
}
