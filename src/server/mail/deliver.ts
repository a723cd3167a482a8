import { createTransport } from 'nodemailer';
import type { MailServer } from './mailServer';

/** A message with both bodies, as it goes out. */
export interface Outgoing {
  readonly to: string;
  readonly subject: string;
  readonly text: string;
  readonly html: string;
  readonly messageId: string;
  readonly date: Date;
}

/** How a try went: taken, refused for good, or to be tried again. */
export type Delivery = { readonly kind: 'sent' } | { readonly kind: 'refused' | 'again'; readonly error: string };

/** How long the server may take: to be reached, to greet, between two words, and for all of it. [ms] */
export interface Patience {
  readonly connectMs: number;
  readonly greetMs: number;
  readonly silenceMs: number;
  readonly allMs: number;
}

const PATIENCE: Patience = { connectMs: 10_000, greetMs: 10_000, silenceMs: 20_000, allMs: 90_000 };

interface SmtpError {
  readonly code?: string;
  readonly command?: string;
  readonly responseCode?: number;
}

/** The server's last word on this address or this message; what it says of us or of itself may change. */
function isFinal(error: SmtpError): boolean {
  const aboutMessage = error.command === 'RCPT TO' || error.command === 'DATA';
  return aboutMessage && (error.responseCode ?? 0) >= 500 && (error.responseCode ?? 0) < 600;
}

const worded = (error: unknown): string => (error instanceof Error ? error.message : String(error)).slice(0, 500);

/**
 * Hands one message to the server and waits for its answer, never longer than its patience lasts. Where the answer to
 * a message that was handed over whole is lost, nobody can know whether it was taken: it is tried again, and arrives
 * twice at worst, under the same Message-ID.
 */
export async function deliver(server: MailServer, mail: Outgoing, patience: Patience = PATIENCE): Promise<Delivery> {
  const { host, port, secure, auth, from, isLoopback } = server;
  const transport = createTransport({
    host,
    port,
    secure,
    ...(auth ? { auth } : {}),
    // A password goes out encrypted or not at all.
    requireTLS: auth !== null && !isLoopback,
    ignoreTLS: isLoopback,
    connectionTimeout: patience.connectMs,
    dnsTimeout: patience.connectMs,
    greetingTimeout: patience.greetMs,
    socketTimeout: patience.silenceMs,
    disableFileAccess: true,
    disableUrlAccess: true,
  });
  try {
    // Machines that answer letters automatically leave this one alone.
    const headers = { 'Auto-Submitted': 'auto-generated' };
    await transport.sendMail({ ...mail, from, headers, signal: AbortSignal.timeout(patience.allMs) });
    return { kind: 'sent' };
  } catch (error) {
    return { kind: isFinal(error as SmtpError) ? 'refused' : 'again', error: worded(error) };
  } finally {
    transport.close();
  }
}
