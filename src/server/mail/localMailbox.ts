import { readdir, readFile } from 'node:fs/promises';
import { join } from 'node:path';
import { simpleParser } from 'mailparser';
import type { LocalMailDto, LocalMailHeadDto } from '@/contracts/mail';
import { fail, ok, type Result } from '@/core/result';
import type { Authorized } from '../auth/permissions';
import { notFound, type HttpProblem } from '../http/problem';
import { mailServer } from './mailServer';

const SHOWN = 50;
const NAME = /^\d{15}-[0-9a-f-]{36}$/;

type Env = Readonly<Record<string, string | undefined>>;

const real: HttpProblem = notFound(
  'Messages go out through the mail server that is set up; they are read in people’s own mailboxes.',
);

/** The folder of the start command's own mail server; null where messages go to people's mailboxes. */
export function localMailFolder(env: Env = process.env): string | null {
  const folder = env.LOCAL_MAIL_FOLDER?.trim();
  try {
    return folder && mailServer(env)?.isLoopback ? folder : null;
  } catch {
    // What is named can't be a mail server; the worker says so.
    return null;
  }
}

async function read(folder: string, id: string): Promise<LocalMailDto> {
  const mail = await simpleParser(await readFile(join(folder, `${id}.eml`)), { skipImageLinks: true });
  const to = Array.isArray(mail.to) ? mail.to : mail.to ? [mail.to] : [];
  return {
    id,
    to: to.map((one) => one.text).join(', '),
    from: mail.from?.text ?? '',
    subject: mail.subject ?? '',
    messageId: mail.messageId ?? '',
    receivedAt: new Date(Number(id.slice(0, 15))).toISOString(),
    text: mail.text ?? '',
    html: typeof mail.html === 'string' ? mail.html : '',
  };
}

/** What the start command's mail server has received, newest first. */
export async function listLocalMail(_actor: Authorized<'mail.read'>): Promise<Result<LocalMailHeadDto[], HttpProblem>> {
  const folder = localMailFolder();
  if (!folder) return fail(real);
  const files = await readdir(folder).catch(() => []);
  const ids = files.flatMap((file) => (file.endsWith('.eml') ? [file.slice(0, -4)] : [])).filter((id) => NAME.test(id));
  const newest = ids.sort().reverse().slice(0, SHOWN);
  const mails = await Promise.all(newest.map((id) => read(folder, id).catch(() => null)));
  return ok(mails.flatMap((mail) => (mail ? [headOf(mail)] : [])));
}

const headOf = ({ id, to, subject, receivedAt }: LocalMailDto): LocalMailHeadDto => ({ id, to, subject, receivedAt });

/** One of its messages, whole. */
export async function readLocalMail(
  _actor: Authorized<'mail.read'>,
  id: string,
): Promise<Result<LocalMailDto, HttpProblem>> {
  const folder = localMailFolder();
  if (!folder) return fail(real);
  const mail = NAME.test(id) ? await read(folder, id).catch(() => null) : null;
  return mail ? ok(mail) : fail(notFound('There is no such message, or it has made room for newer ones.'));
}
