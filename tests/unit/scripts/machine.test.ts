import { rmSync } from 'node:fs';
import { type AddressInfo, createServer } from 'node:net';
import { afterAll, afterEach, describe, expect, it } from 'vitest';
import { type Lock, takeLock } from '../../../scripts/support/lock';
import { anyFreePort, freePortFrom, isPortFree } from '../../../scripts/support/ports';
import { statePath } from '../../../scripts/support/project';
import { cleanEnv } from '../../../scripts/support/run';

const NAME = `unit-${process.pid}`;
afterAll(() => rmSync(statePath(`${NAME}.lock`), { force: true }));

describe('locks between processes', () => {
  const held: (Lock | undefined)[] = [];
  afterEach(async () => {
    for (const lock of held.splice(0)) await lock?.release();
  });

  it('are had by one, and by the next once let go', async () => {
    const first = await takeLock(NAME);
    expect(first).toBeDefined();
    expect(await takeLock(NAME)).toBeUndefined();
    await first?.release();
    const second = await takeLock(NAME);
    held.push(second);
    expect(second).toBeDefined();
  });

  it('are shared by all who ask to share, and keep out who wants it alone', async () => {
    held.push(await takeLock(NAME, { shared: true }), await takeLock(NAME, { shared: true }));
    expect(held.every(Boolean)).toBe(true);
    expect(await takeLock(NAME)).toBeUndefined();
  });
});

describe('ports', () => {
  it('that are taken are passed over', async () => {
    const server = createServer();
    await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve));
    const { port } = server.address() as AddressInfo;
    expect(await isPortFree(port)).toBe(false);
    expect(await freePortFrom(port)).toBeGreaterThan(port);
    await new Promise((resolve) => server.close(resolve));
    expect(await isPortFree(port)).toBe(true);
  });

  it('of the kernel’s choosing are free', async () => {
    expect(await isPortFree(await anyFreePort())).toBe(true);
  });
});

describe('the environment handed on', () => {
  it('has none of the variables that turn PostgreSQL clients to another server', () => {
    process.env['PGHOST'] = 'elsewhere.example';
    const env = cleanEnv({ DATABASE_URL: 'postgresql://127.0.0.1/x' });
    delete process.env['PGHOST'];
    expect(env).not.toHaveProperty('PGHOST');
    expect(env).toHaveProperty('DATABASE_URL');
  });
});
