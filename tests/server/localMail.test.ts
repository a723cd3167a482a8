import { mkdtempSync, readdirSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import type { Role } from '@/contracts/account';
import { authorize } from '@/server/auth/permissions';
import { deliver } from '@/server/mail/deliver';
import { letter } from '@/server/mail/letter';
import { listLocalMail, readLocalMail } from '@/server/mail/localMailbox';
import { mailServer } from '@/server/mail/mailServer';
import { startLocalMail, type LocalMail } from '../../scripts/support/localMail';

const authorized = authorize(
  {
    personId: 'ada',
    name: 'Ada',
    plantId: 'north',
    plantName: 'North',
    isDemo: true,
    roles: ['administrator'] as Role[],
  },
  'mail.read',
);
if (!authorized.ok) throw new Error('an administrator may not read local mail');
const ada = authorized.value;

let folder: string;
let mail: LocalMail;
let before: NodeJS.ProcessEnv;

beforeEach(async () => {
  before = { ...process.env };
  folder = mkdtempSync(join(tmpdir(), 'steadmain-mail-'));
  mail = await startLocalMail(folder);
  Object.assign(process.env, { SMTP_URL: mail.url, LOCAL_MAIL_FOLDER: folder });
});
afterEach(async () => {
  process.env = before;
  await mail.stop();
  rmSync(folder, { recursive: true, force: true });
});

async function send(subject: string, to = 'nora@plant.example'): Promise<void> {
  const server = mailServer();
  if (!server) throw new Error('no mail server');
  const parts = { subject, title: subject, paragraphs: ['Ä word with an accent – and a dash.'], foot: 'Why.' };
  const outgoing = { to, ...letter(parts), messageId: `<${subject}@plant.example>`, date: new Date(0) };
  expect(await deliver(server, outgoing)).toEqual({ kind: 'sent' });
}

describe('the start command’s mail server', () => {
  it('keeps what it is given; an administrator reads it, newest first', async () => {
    await send('one');
    await send('two', 'ulla@plant.example');
    const list = await listLocalMail(ada);
    expect(list).toMatchObject({ ok: true, value: [{ subject: 'two', to: 'ulla@plant.example' }, { subject: 'one' }] });
    const id = list.ok ? (list.value[1]?.id ?? '') : '';
    expect(await readLocalMail(ada, id)).toMatchObject({
      ok: true,
      value: { messageId: '<one@plant.example>', text: expect.stringContaining('Ä word with an accent – and a dash.') },
    });
  });

  it('leaves no half-written message to be read', async () => {
    await send('whole');
    expect(readdirSync(folder).every((file) => file.endsWith('.eml'))).toBe(true);
    writeFileSync(join(folder, '000000000000001-00000000-0000-0000-0000-000000000000.part'), 'Subject: half');
    const list = await listLocalMail(ada);
    expect(list.ok && list.value.map(({ subject }) => subject)).toEqual(['whole']);
  });

  it.each(['../../../etc/passwd', '..', '', 'x', '000000000000001-00000000-0000-0000-0000-000000000009'])(
    'gives nothing under the name %j',
    async (id) => expect(await readLocalMail(ada, id)).toMatchObject({ ok: false, error: { status: 404 } }),
  );

  it('is not read in the application where the mail server is a real one', async () => {
    await send('one');
    process.env.SMTP_URL = 'smtp://mail.plant.example';
    const refused = { ok: false, error: { status: 404, message: expect.stringMatching(/mail server that is set up/) } };
    expect(await listLocalMail(ada)).toMatchObject(refused);
    expect(await readLocalMail(ada, readdirSync(folder)[0]?.slice(0, -4) ?? '')).toMatchObject(refused);
  });
});
