import { createServer } from 'node:net';

function listens(port: number, host: string): Promise<number | undefined> {
  return new Promise((resolve) => {
    const server = createServer();
    // No IPv6 on this machine: nobody can be in the way there.
    server.once('error', (error: NodeJS.ErrnoException) => resolve(error.code === 'EADDRINUSE' ? undefined : port));
    server.listen({ port, host, exclusive: true }, () => {
      const address = server.address();
      server.close(() => resolve(typeof address === 'object' && address ? address.port : port));
    });
  });
}

/** Whether nothing on this machine listens on the port, on either loopback address or on all of them. */
export async function isPortFree(port: number): Promise<boolean> {
  for (const host of ['127.0.0.1', '::1', '0.0.0.0']) {
    if ((await listens(port, host)) === undefined) return false;
  }
  return true;
}

/** A port of the kernel's choosing, free at this moment on 127.0.0.1. */
export async function anyFreePort(): Promise<number> {
  const port = await listens(0, '127.0.0.1');
  if (!port) throw new Error('The kernel gave no free port');
  return port;
}

/** The first free port from `wanted` upwards. */
export async function freePortFrom(wanted: number): Promise<number> {
  for (let port = wanted; port < Math.min(wanted + 100, 65_536); port += 1) {
    if (await isPortFree(port)) return port;
  }
  throw new Error(`No free port between ${wanted} and ${wanted + 99}`);
}
