import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterEach, beforeEach, describe, expect, test } from 'vitest';
import { composeMail } from '#server/mail/compose-mail.ts';
import { createMailTransport } from '#server/mail/transport.ts';
import { startMailServer } from '#tests/support/mail-server.ts';
import type { TestMailServer } from '#tests/support/mail-server.ts';
import { linkIn, readMailFolder } from '#tests/support/mail-folder.ts';
import { FIRST_START, startTestServer } from '#tests/support/server.ts';
import type { SignedIn, TestServer } from '#tests/support/server.ts';

const TEAM = '/api/teams/tern-rock';
const TOVE = { name: 'Tove Å. Bråten', email: 'tove.braten@skerry.example', role: 'member' };
const MINUTE = 60_000;

let mailServer: TestMailServer;
let app: TestServer;
let ines: SignedIn;
beforeEach(async () => {
  mailServer = await startMailServer();
  app = await startTestServer({
    mailTransport: createMailTransport({
      smtpUrl: mailServer.url,
      dataFolder: '/nowhere',
      from: 'Holdwater <holdwater@skerry.example>',
    }),
  });
  ines = await app.signIn('ines');
});
afterEach(async () => {
  await app.stop();
  await mailServer.stop();
});

const deliver = () => app.server.deps.mail.wake();
const later = (minutes: number) => app.setNow(new Date(FIRST_START.getTime() + minutes * MINUTE));
/** The team's mail but for what came with the demonstration. */
const outbox = async () =>
  (await ines.get(`${TEAM}/outbox`)).body.filter(({ id }: { id: string }) => !id.startsWith('demo-'));

describe('mail by SMTP', () => {
  test('invitation, when the mail server takes it: arrives with its link, and is told to the captain without', async () => {
    await ines.post(`${TEAM}/invitations`, TOVE);
    await deliver();

    expect(mailServer.taken).toHaveLength(1);
    const [mail = ''] = mailServer.taken;
    expect(mail).toContain('To: =?UTF-8?');
    expect(mail).toContain('<tove.braten@skerry.example>');
    expect(mail).toContain('Subject: Tern Rock asks you to join');
    const [entry] = await outbox();
    expect(entry).toMatchObject({ state: 'sent', kind: 'invitation', mayRetry: false, error: null });
    expect(entry.text).toContain('[the link]');
    expect(JSON.stringify(entry)).not.toContain('/join/');
    const row = await app.server.deps.database.models.outbox.findByPk(entry.id, { raw: true });
    expect(row?.link).toBeNull();
  });

  test('invitation, when the mail server is down: is made all the same, and the mail is tried until it is taken', async () => {
    const port = Number(new URL(mailServer.url).port);
    await mailServer.stop();

    const answer = await ines.post(`${TEAM}/invitations`, TOVE);
    await deliver();

    expect(answer.status).toBe(201);
    expect((await outbox())[0]).toMatchObject({
      state: 'waiting',
      error: 'The mail server could not be reached.',
      nextTryAt: new Date(FIRST_START.getTime() + MINUTE).toISOString(),
      mayRetry: true,
    });

    mailServer = await startMailServer(port);
    await deliver();
    expect(mailServer.taken).toHaveLength(0);
    later(1);
    await deliver();
    expect(mailServer.taken).toHaveLength(1);
    expect((await outbox())[0]).toMatchObject({ state: 'sent', error: null });
  });

  test('mail, when it is refused for now again and again: waits longer each time, then fails; by hand it goes again', async () => {
    mailServer.refuseWith(451);
    await ines.post(`${TEAM}/invitations`, TOVE);
    await deliver();
    const waits: number[] = [];
    for (let n = 1; n < 12; n += 1) {
      const [{ nextTryAt }] = await outbox();
      if (nextTryAt === null) break;
      const now = app.server.deps.now().getTime();
      waits.push((Date.parse(nextTryAt) - now) / MINUTE);
      app.setNow(new Date(nextTryAt));
      await deliver();
    }

    expect(waits).toEqual([1, 5, 15, 60, 240, 480, 720]);
    const [failed] = await outbox();
    expect(failed.state).toBe('failed');
    mailServer.refuseWith(null);
    expect((await (await app.signIn('ines')).post(`${TEAM}/outbox/${failed.id}/retry`)).status).toBe(204);
    await deliver();
    expect(mailServer.taken).toHaveLength(1);
  });

  test('mail, when the address is refused for good: fails at once and says so', async () => {
    mailServer.refuseWith(550);
    await ines.post(`${TEAM}/invitations`, TOVE);
    await deliver();

    expect((await outbox())[0]).toMatchObject({
      state: 'failed',
      error: 'The mail server refused this address. Look whether it is spelt right.',
    });
  });

  test('withdrawn invitation, when its mail still waits: is not sent any more, and cannot be by hand', async () => {
    mailServer.refuseWith(451);
    const { body } = await ines.post(`${TEAM}/invitations`, TOVE);
    await deliver();
    await ines.delete(`${TEAM}/invitations/${body.id}`);
    mailServer.refuseWith(null);
    later(60);
    await deliver();

    expect(mailServer.taken).toHaveLength(0);
    const [entry] = await outbox();
    expect(entry).toMatchObject({ state: 'failed', mayRetry: false });
    expect((await ines.post(`${TEAM}/outbox/${entry.id}/retry`)).body.code).toBe('not-to-be-sent');
  });

  test('new passphrase, when a person of the team asks for one: its mail is in no outbox that a captain reads', async () => {
    const stranger = await app.stranger();
    await stranger.post('/api/password-resets', { email: 'kasimir.lund@skerry.example' });
    await deliver();

    expect(mailServer.taken).toHaveLength(1);
    expect(await outbox()).toEqual([]);
  });

  test('mail of another team, when a captain tries it again: does not exist', async () => {
    await ines.post(`${TEAM}/invitations`, TOVE);
    const [entry] = await outbox();
    const sunniva = await app.signIn('sunniva');

    expect((await sunniva.post(`/api/teams/gannet-bank/outbox/${entry.id}/retry`)).status).toBe(404);
  });
});

describe('mail as files', () => {
  test('mail, when no mail server is named: is laid down as a file with its link', async () => {
    const dataFolder = mkdtempSync(join(tmpdir(), 'holdwater-mail-'));
    const transport = createMailTransport({ smtpUrl: null, dataFolder, from: 'Holdwater <a@b.example>' });
    const link = `https://a-rather-long-name-of-a-host.skerry-university.example/join/${'x'.repeat(43)}`;

    await transport.send({
      id: 'm1',
      writtenAt: FIRST_START.toISOString(),
      to: { name: TOVE.name, address: TOVE.email },
      subject: 'Tern Rock asks you to join',
      text: `Kære Tove,\n\n${link}\n`,
    });

    const [mail = ''] = readMailFolder(dataFolder);
    expect(linkIn(mail)).toBe(`/join/${'x'.repeat(43)}`);
    rmSync(dataFolder, { recursive: true });
  });
});

describe('templates', () => {
  test('template, when a word has no value: throws instead of sending braces', () => {
    expect(() => composeMail('reset', { name: 'Ines' })).toThrow(/needs a value for until/);
  });

  test('template, when a value looks like a word of it: is left as it is', () => {
    const { text } = composeMail('reset', { name: '{until} $& {link}', until: 'noon' });

    expect(text).toContain('Dear {until} $& {link},');
  });
});
