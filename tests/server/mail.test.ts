import { spawn } from 'node:child_process';
import { fileURLToPath } from 'node:url';
import { eq, sql } from 'drizzle-orm';
import { beforeAll, beforeEach, describe, expect, it, onTestFinished } from 'vitest';
import { db } from '@/db/client';
import { mails } from '@/db/schema/index';
import { deliver, type Outgoing, type Patience } from '@/server/mail/deliver';
import { letter } from '@/server/mail/letter';
import type { MailServer } from '@/server/mail/mailServer';
import { queueMail } from '@/server/mail/mails.repo';
import { sendDue, startMailSender, type Deliver } from '@/server/mail/sender';
import { anyFreePort } from '../../scripts/support/ports';
import { fakeMail, mute, serverAt, smtpError } from '../support/mailServers';
import { openWorld } from '../support/world';

beforeAll(openWorld);
beforeEach(async () => void (await db.delete(mails)));

/** Short, so that a hanging server is given up within a test; the order of the limits is as in use. */
const IMPATIENT: Patience = { connectMs: 300, greetMs: 300, silenceMs: 300, allMs: 900 };
const impatient: Deliver = (server, mail) => deliver(server, mail, IMPATIENT);

const LETTER = letter({
  subject: 'Issue 7 is on the floor',
  title: 'Issue 7',
  paragraphs: ['Line 1 & 2 <moved>.'],
  action: { label: 'Open the shift sheet', href: 'http://steadmain.test/shift?line=1&shift=2' },
  foot: 'You get this as a supervisor.',
});

const queue = (to = 'sam@plant.example', goodForMinutes = 60): Promise<string> =>
  db.transaction((tx) => queueMail(tx, { plantId: 'north', to, letter: LETTER, goodForMinutes }));

async function rowOf(id: string) {
  const [row] = await db.select().from(mails).where(eq(mails.id, id));
  if (!row) throw new Error(`no mail ${id}`);
  return row;
}

const makeDue = (): Promise<unknown> =>
  db
    .update(mails)
    .set({ nextTryAt: sql`now() - interval '1 second'` })
    .where(eq(mails.state, 'queued'));

async function fake(...args: Parameters<typeof fakeMail>) {
  const server = await fakeMail(...args);
  onTestFinished(() => server.stop());
  return server;
}

async function hanging(...args: Parameters<typeof mute>) {
  const server = await mute(...args);
  onTestFinished(() => server.stop());
  return server;
}

describe('a message', () => {
  it('arrives with both bodies, from and to whom it should, and is then forgotten', async () => {
    const server = await fake();
    const id = await queue();
    expect(await sendDue(server.server)).toBe(1);
    const [mail] = server.mails;
    expect(mail?.subject).toBe('Issue 7 is on the floor');
    expect(mail?.from?.text).toContain('steadmain@plant.example');
    expect(mail?.text).toContain('Line 1 & 2 <moved>.');
    expect(mail?.text).toContain('http://steadmain.test/shift?line=1&shift=2');
    expect(mail?.html).toContain('Line 1 &amp; 2 &lt;moved&gt;.');
    expect(mail?.html).toContain('href="http://steadmain.test/shift?line=1&amp;shift=2"');
    expect(mail?.html).not.toMatch(/<img|<link|<script/);
    const row = await rowOf(id);
    expect(row).toMatchObject({ state: 'sent', tries: 1, text: null, html: null, lastError: null });
    expect(mail?.messageId).toBe(row.messageId);
  });

  it('is queued only if what it tells of happens', async () => {
    const failed = db.transaction(async (tx) => {
      await queueMail(tx, { plantId: 'north', to: 'sam@plant.example', letter: LETTER, goodForMinutes: 60 });
      throw new Error('not after all');
    });
    await expect(failed).rejects.toThrow('not after all');
    expect(await db.$count(mails)).toBe(0);
  });

  it('can’t smuggle a header in by its subject or a recipient by its address', async () => {
    const server = await fake();
    const sly = letter({ subject: 'Hello\r\nBcc: eve@plant.example', title: 'x', paragraphs: [], foot: 'x' });
    await db.transaction((tx) =>
      queueMail(tx, { plantId: null, to: 'sam@plant.example', letter: sly, goodForMinutes: 60 }),
    );
    await sendDue(server.server);
    expect(server.mails[0]?.subject).toBe('Hello Bcc: eve@plant.example');
    expect(server.mails[0]?.bcc).toBeUndefined();
  });

  it('to an address kept for examples never goes to a real server', async () => {
    let tries = 0;
    const real: MailServer = { ...serverAt(25), host: 'mail.plant.example', isLoopback: false };
    const id = await queue('petra@tarnhollow.example');
    await sendDue(real, async () => ({ kind: tries++ ? 'again' : 'sent', error: '' }));
    expect(tries).toBe(0);
    expect(await rowOf(id)).toMatchObject({ state: 'failed', lastError: 'The address leads nowhere.' });
  });
});

describe('a server that', () => {
  it('is down loses nothing: the message is sent when it is back', async () => {
    const id = await queue();
    expect(await sendDue(serverAt(await anyFreePort()), impatient)).toBe(1);
    const row = await rowOf(id);
    expect(row).toMatchObject({ state: 'queued', tries: 1, lastError: expect.stringContaining('ECONNREFUSED') });
    expect(row.text).not.toBeNull();
    const back = await fake();
    expect(await sendDue(back.server)).toBe(0);
    await makeDue();
    expect(await sendDue(back.server)).toBe(1);
    expect(back.mails.map((mail) => mail.messageId)).toEqual([row.messageId]);
    expect(await rowOf(id)).toMatchObject({ state: 'sent', tries: 2 });
  });

  it('is down is asked again after growing waits', async () => {
    const id = await queue();
    const waits: number[] = [];
    const down: Deliver = async () => ({ kind: 'again', error: 'down' });
    for (let i = 0; i < 9; i++) {
      await makeDue();
      await sendDue(serverAt(1), down);
      const [row] = await db
        .select({ wait: sql<number>`round(extract(epoch from next_try_at - now()))::int` })
        .from(mails)
        .where(eq(mails.id, id));
      waits.push(row?.wait ?? 0);
    }
    const near = [10, 30, 120, 300, 900, 1_800, 3_600, 3_600, 3_600];
    waits.forEach((wait, i) => expect(Math.abs(wait - (near[i] ?? 0))).toBeLessThanOrEqual(5));
  });

  it.each<[string, (socket: import('node:net').Socket) => void]>([
    ['never greets', () => undefined],
    ['greets and then says nothing', (socket) => void socket.write('220 hello\r\n')],
    [
      'speaks without ever finishing a word',
      (socket) => {
        const timer = setInterval(() => socket.write('2'), 50);
        socket.on('close', () => clearInterval(timer));
      },
    ],
  ])('%s is left, its connection closed, and the message kept', async (_, speak) => {
    const server = await hanging(speak);
    const id = await queue();
    expect(await sendDue(server.server, impatient)).toBe(1);
    expect(await rowOf(id)).toMatchObject({ state: 'queued', tries: 1, lastError: expect.any(String) });
    await expect
      .poll(() => [...server.connections].every((socket) => socket.destroyed || socket.readableEnded))
      .toBe(true);
  });

  it('dies before it has all of the message gets it once, later', async () => {
    let cut = false;
    const server = await fake({
      onRcptTo(_address, session, done) {
        if (cut) return done(null);
        cut = true;
        done(smtpError(421, `closing, ${session.remoteAddress}`));
      },
    });
    const id = await queue();
    await sendDue(server.server, impatient);
    expect(await rowOf(id)).toMatchObject({ state: 'queued', tries: 1 });
    expect(server.mails).toHaveLength(0);
    await makeDue();
    await sendDue(server.server, impatient);
    expect(server.mails).toHaveLength(1);
  });

  it('dies after DATA, its answer lost, gets the same Message-ID again and nothing else twice', async () => {
    const server = await fake({}, (nth, done, cut) => (nth === 1 ? cut() : done(null)));
    const first = await queue();
    await sendDue(server.server, impatient);
    expect(await rowOf(first)).toMatchObject({ state: 'queued', tries: 1 });
    const second = await queue('ulla@plant.example');
    await makeDue();
    await sendDue(server.server, impatient);
    const ids = server.mails.map((mail) => mail.messageId);
    const [one, other] = [(await rowOf(first)).messageId, (await rowOf(second)).messageId];
    expect(ids.filter((id) => id === one)).toHaveLength(2);
    expect(ids.filter((id) => id === other)).toHaveLength(1);
    const copies = server.mails.filter((mail) => mail.messageId === one);
    expect(copies[0]?.date).toEqual(copies[1]?.date);
  });

  it('refuses an address for good is not asked again', async () => {
    const server = await fake({ onRcptTo: (_address, _session, done) => done(smtpError(550, 'no such mailbox')) });
    const id = await queue();
    await sendDue(server.server, impatient);
    expect(await rowOf(id)).toMatchObject({ state: 'failed', text: null, lastError: expect.stringContaining('550') });
    await makeDue();
    expect(await sendDue(server.server, impatient)).toBe(0);
  });

  it.each([
    ['a mailbox that is full for now', { onRcptTo: smtpError(452, 'full') }],
    ['our own address, for good', { onMailFrom: smtpError(550, 'who are you') }],
  ])('refuses %s is asked again', async (_, refusal) => {
    const [on, error] = Object.entries(refusal)[0] ?? [];
    const server = await fake({
      [on ?? '']: (_a: unknown, _s: unknown, done: (e: Error) => void) => done(error as Error),
    });
    const id = await queue();
    await sendDue(server.server, impatient);
    expect(await rowOf(id)).toMatchObject({ state: 'queued', tries: 1 });
  });

  it('refuses the message after DATA is not asked again', async () => {
    const server = await fake({}, (_nth, done) => done(smtpError(554, 'no such content here')));
    const id = await queue();
    await sendDue(server.server, impatient);
    expect(await rowOf(id)).toMatchObject({ state: 'failed', tries: 1 });
  });

  it('hangs over one message holds up no other for good', async () => {
    const server = await fake({}, (nth, done) => (nth === 1 ? undefined : done(null)));
    const held = await queue();
    const other = await queue('ulla@plant.example');
    await sendDue(server.server, impatient);
    expect([(await rowOf(held)).state, (await rowOf(other)).state].sort()).toEqual(['queued', 'sent']);
  });
});

describe('several workers', () => {
  it('send each message once between them', async () => {
    const server = await fake();
    const ids = await Promise.all(Array.from({ length: 12 }, (_, i) => queue(`p${i}@plant.example`)));
    const tried = await Promise.all([sendDue(server.server), sendDue(server.server), sendDue(server.server)]);
    expect(tried.reduce((a, b) => a + b, 0)).toBe(12);
    expect(new Set(server.mails.map((mail) => mail.messageId)).size).toBe(12);
    expect(server.mails).toHaveLength(12);
    for (const id of ids) expect(await rowOf(id)).toMatchObject({ state: 'sent', tries: 1 });
  });

  it('take over from one that died while sending, but not before its lease is over', async () => {
    const server = await fake();
    const id = await queue();
    const dies: Deliver = () => {
      throw new Error('as if the machine had lost power');
    };
    await expect(sendDue(server.server, dies)).rejects.toThrow('lost power');
    expect(await rowOf(id)).toMatchObject({ state: 'sending', tries: 1 });
    expect(await sendDue(server.server)).toBe(0);
    await db.update(mails).set({ leaseEndsAt: sql`now() - interval '1 second'` });
    expect(await sendDue(server.server)).toBe(1);
    expect(await rowOf(id)).toMatchObject({ state: 'sent', tries: 2 });
  });

  it('take over from a process that is killed while the server has the message and has not answered', async () => {
    const server = await fake({}, (nth, done) => (nth === 1 ? undefined : done(null)));
    const id = await queue();
    const env = { ...process.env, SMTP_URL: `smtp://127.0.0.1:${server.server.port}` };
    const entry = fileURLToPath(new URL('../support/mailWorker.ts', import.meta.url));
    const worker = spawn(process.execPath, ['--import', 'tsx', entry], {
      env,
      stdio: 'inherit',
    });
    const ended = new Promise((resolve) => worker.once('exit', resolve));
    await expect.poll(() => server.mails.length, { timeout: 30_000 }).toBe(1);
    worker.kill('SIGKILL');
    await ended;
    expect(await rowOf(id)).toMatchObject({ state: 'sending', tries: 1 });
    await db.update(mails).set({ leaseEndsAt: sql`now() - interval '1 second'` });
    await sendDue(server.server);
    const { messageId, state } = await rowOf(id);
    expect(state).toBe('sent');
    expect(server.mails.map((mail) => mail.messageId)).toEqual([messageId, messageId]);
  });

  it('do not undo what another has done since', async () => {
    const server = await fake();
    const id = await queue();
    const late: Deliver = async () => {
      await db.update(mails).set({ leaseEndsAt: sql`now() - interval '1 second'` });
      await sendDue(server.server);
      return { kind: 'again', error: 'too late to say so' };
    };
    await sendDue(server.server, late);
    expect(await rowOf(id)).toMatchObject({ state: 'sent', tries: 2, lastError: null });
  });
});

describe('a message of no more use', () => {
  it('is given up and its bodies erased', async () => {
    const server = await fake();
    const id = await queue('sam@plant.example', 0);
    expect(await sendDue(server.server)).toBe(0);
    expect(await rowOf(id)).toMatchObject({ state: 'failed', text: null, html: null, lastError: 'Not sent in time.' });
  });
});

describe('the sender', () => {
  it('sends what is queued while it runs, and stops', async () => {
    const server = await fake();
    const sender = startMailSender(server.server);
    const id = await queue();
    await expect.poll(async () => (await rowOf(id)).state, { timeout: 10_000 }).toBe('sent');
    await sender.stop();
    const after = await queue();
    expect(await rowOf(after)).toMatchObject({ state: 'queued', tries: 0 });
  });

  it('without a mail server leaves the queue alone', async () => {
    const id = await queue();
    const sender = startMailSender(null);
    await sender.stop();
    expect(await rowOf(id)).toMatchObject({ state: 'queued', tries: 0 });
  });
});

describe('a password for the mail server', () => {
  it('is never sent in the clear to another machine', async () => {
    const heard: string[] = [];
    const server = await hanging((socket) => {
      socket.write('220 hello\r\n');
      socket.on('data', (chunk) => {
        heard.push(String(chunk));
        socket.write(/^EHLO/i.test(String(chunk)) ? '250-hello\r\n250 AUTH PLAIN LOGIN\r\n' : '502 no\r\n');
      });
    });
    const remote: MailServer = { ...server.server, isLoopback: false, auth: { user: 'u', pass: 'secret' } };
    const mail: Outgoing = { to: 'a@b.example', ...LETTER, messageId: '<1@b.example>', date: new Date(0) };
    expect((await deliver(remote, mail, IMPATIENT)).kind).toBe('again');
    expect(heard.join('')).not.toMatch(/AUTH/);
  });
});
