import { createServer, type AddressInfo, type Server, type Socket } from 'node:net';
import { simpleParser, type ParsedMail } from 'mailparser';
import { SMTPServer, type SMTPServerOptions } from 'smtp-server';
import type { MailServer } from '@/server/mail/mailServer';

/** The application's view of a server on loopback. */
export const serverAt = (port: number): MailServer => ({
  host: '127.0.0.1',
  port,
  secure: false,
  auth: null,
  from: 'Steadmain <steadmain@plant.example>',
  isLoopback: true,
});

/** A mail server that takes everything, or is told to do otherwise; what arrived whole is in `mails`. */
export interface FakeMail {
  readonly server: MailServer;
  readonly mails: ParsedMail[];
  stop(): Promise<void>;
}

/** `answer` sees each whole message, the count of those before it, and the socket-closing way out. */
export async function fakeMail(
  options: SMTPServerOptions = {},
  answer: (nth: number, done: (error?: Error | null) => void, cut: () => void) => void = (_, done) => done(null),
): Promise<FakeMail> {
  const mails: ParsedMail[] = [];
  const sockets = new Set<Socket>();
  const server = new SMTPServer({
    disabledCommands: ['AUTH', 'STARTTLS'],
    disableReverseLookup: true,
    closeTimeout: 50,
    onData(stream, _session, done) {
      void simpleParser(stream).then((mail) => {
        mails.push(mail);
        answer(mails.length, done, () => sockets.forEach((socket) => socket.destroy()));
      });
    },
    ...options,
  });
  server.on('error', () => undefined);
  server.server.on('connection', (socket: Socket) => sockets.add(socket));
  await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', () => resolve()));
  const { port } = server.server.address() as AddressInfo;
  return {
    server: serverAt(port),
    mails,
    stop: () => new Promise<void>((resolve) => server.close(() => resolve())),
  };
}

/** A refusal with an SMTP status. */
export const smtpError = (status: number, message: string): Error =>
  Object.assign(new Error(message), { responseCode: status });

/** A server that takes connections and says only what `speak` writes. */
export async function mute(speak: (socket: Socket) => void = () => undefined) {
  const sockets = new Set<Socket>();
  const server: Server = createServer((socket) => {
    sockets.add(socket);
    socket.on('error', () => undefined);
    // Unread, an end would never be noticed.
    socket.resume();
    speak(socket);
  });
  await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', () => resolve()));
  const { port } = server.address() as AddressInfo;
  return {
    server: serverAt(port),
    connections: sockets,
    stop: async () => {
      sockets.forEach((socket) => socket.destroy());
      await new Promise<void>((resolve) => server.close(() => resolve()));
    },
  };
}
