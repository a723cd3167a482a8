import type { IncomingHttpHeaders } from 'node:http';

const FORWARDED = ['forwarded', 'x-forwarded-for', 'x-forwarded-host', 'x-forwarded-port', 'x-forwarded-proto'];

/**
 * Anybody can send these headers, and what follows believes them (addresses are counted for rate limits). Without a
 * proxy they are dropped; behind one, only the address that the proxy itself added, the last, is kept.
 */
export function keepTrusted(headers: IncomingHttpHeaders, behindProxy: boolean): void {
  const client = [headers['x-forwarded-for'] ?? ''].flat().join(',').split(',').pop()?.trim();
  const proto = [headers['x-forwarded-proto'] ?? ''].flat().join(',').split(',').pop()?.trim();
  for (const name of FORWARDED) delete headers[name];
  if (!behindProxy) return;
  if (client) headers['x-forwarded-for'] = client;
  if (proto) headers['x-forwarded-proto'] = proto;
}
