/** Where messages are handed over, as the environment says. */
export interface MailServer {
  readonly host: string;
  readonly port: number;
  /** TLS from the first byte; otherwise it is started by STARTTLS where the server offers it. */
  readonly secure: boolean;
  readonly auth: { readonly user: string; readonly pass: string } | null;
  /** As it stands in messages: `Name <address>`. */
  readonly from: string;
  /** On this machine's loopback: nothing leaves. */
  readonly isLoopback: boolean;
}

type Env = Readonly<Record<string, string | undefined>>;

const SMTPS_PORT = 465;
const SUBMISSION_PORT = 587;
const LOOPBACK = new Set(['127.0.0.1', '::1', 'localhost']);

const said = (value: string | undefined): string | null => value?.trim() || null;

function portOf(text: string | null, standard: number): number {
  const port = text === null ? standard : Number(text);
  if (!Number.isInteger(port) || port < 1 || port > 65_535) throw new Error(`no port of a mail server: ${text}`);
  return port;
}

function authOf(user: string | null, pass: string | null): MailServer['auth'] {
  return user === null ? null : { user, pass: pass ?? '' };
}

function fromUrl(text: string): Omit<MailServer, 'from' | 'isLoopback'> {
  const url = new URL(text);
  if (url.protocol !== 'smtp:' && url.protocol !== 'smtps:')
    throw new Error('SMTP_URL starts with smtp:// or smtps://');
  const secure = url.protocol === 'smtps:';
  const auth = authOf(said(decodeURIComponent(url.username)), decodeURIComponent(url.password));
  const host = url.hostname.replace(/^\[|\]$/g, '');
  return { host, port: portOf(said(url.port), secure ? SMTPS_PORT : SUBMISSION_PORT), secure, auth };
}

function fromParts(host: string, env: Env): Omit<MailServer, 'from' | 'isLoopback'> {
  const port = portOf(said(env.SMTP_PORT), SUBMISSION_PORT);
  return { host, port, secure: port === SMTPS_PORT, auth: authOf(said(env.SMTP_USER), env.SMTP_PASS ?? '') };
}

/**
 * The mail server of SMTP_URL, or of SMTP_HOST, SMTP_PORT, SMTP_USER and SMTP_PASS; null where none is named.
 * @throws where what is named can't be a mail server
 */
export function mailServer(env: Env = process.env): MailServer | null {
  const url = said(env.SMTP_URL);
  const host = said(env.SMTP_HOST);
  if (url === null && host === null) return null;
  const server = url === null ? fromParts(host ?? '', env) : fromUrl(url);
  const from = said(env.MAIL_FROM) ?? 'Steadmain <steadmain@localhost>';
  return { ...server, from, isLoopback: LOOPBACK.has(server.host.toLowerCase()) };
}

/** The application's own address, without a slash at its end: links in messages never follow a request's Host. */
export function appAddress(env: Env = process.env): string {
  return (said(env.APP_URL) ?? `http://localhost:${said(env.PORT) ?? '4321'}`).replace(/\/+$/, '');
}
