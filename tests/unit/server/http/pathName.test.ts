import { expect, it } from 'vitest';
import { namedBy } from '@/server/http/pathName';

it.each([
  ['warm%3Aa1', 'warm:a1'],
  ['warm:a1', 'warm:a1'],
  ['a%2Fb', 'a/b'],
  ['%E0%A4%A', ''],
  [undefined, ''],
])('reads %s as %s', (part, named) => {
  expect(namedBy(part)).toBe(named);
});
