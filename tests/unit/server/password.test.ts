import * as argon2 from '@node-rs/argon2';
import { expect, it, vi } from 'vitest';
import { hashPassword, verifyPassword } from '@/server/auth/password';

vi.mock('@node-rs/argon2', { spy: true });

it('is stored as argon2id with a salt of its own', async () => {
  const [one, other] = await Promise.all([hashPassword('steam on'), hashPassword('steam on')]);
  expect(one).toMatch(/^\$argon2id\$v=19\$m=19456,t=2,p=1\$/);
  expect(one).not.toBe(other);
});

it('belongs to its own hash only', async () => {
  const stored = await hashPassword('steam on');
  expect(await verifyPassword(stored, 'steam on')).toBe(true);
  expect(await verifyPassword(stored, 'steam off')).toBe(false);
  expect(await verifyPassword(null, 'steam on')).toBe(false);
});

it('costs the same work where there is no account: one check against a hash of the same cost', async () => {
  const verify = vi.mocked(argon2.verify);
  verify.mockClear();
  await verifyPassword(undefined, 'steam on');
  await verifyPassword(await hashPassword('steam off'), 'steam on');
  expect(verify).toHaveBeenCalledTimes(2);
  const cost = (call: number) => String(verify.mock.calls[call]?.[0]).split('$').slice(1, 4);
  expect(cost(0)).toEqual(cost(1));
});
