/** Who may come in, and what each role finds. */
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import type { Browser } from 'playwright-core';
import { DEMO_PEOPLE, openBrowser, person } from '#tests/support/browser.ts';
import { linkIn, readMailFolder } from '#tests/support/mail-folder.ts';
import { startApp, type RunningApp } from '#tests/support/running-app.ts';

let app: RunningApp;
let browser: Browser;
beforeAll(async () => {
  [app, browser] = await Promise.all([startApp(), openBrowser()]);
});
afterAll(async () => {
  await browser.close();
  await app.stop();
});

describe('signing in', () => {
  test.each([
    ['captain', DEMO_PEOPLE.captain, true],
    ['member', DEMO_PEOPLE.member, true],
    ['advisor', DEMO_PEOPLE.advisor, false],
  ])(
    'as %s: the season opens, and the next trial is offered only to who may write',
    async (_role, email, writes) => {
      const { page, context } = await person(browser, app.url, email);
      await page.getByRole('heading', { level: 1, name: /Fight 2 is in 11 days/ }).waitFor();

      await page.goto(`${app.url}/team/tern-rock/problem/1/trials`);
      await page.getByRole('heading', { level: 1, name: 'Trials' }).waitFor();

      expect(await page.getByRole('button', { name: 'Log trial' }).count()).toBe(writes ? 1 : 0);
      await context.close();
    },
  );

  test('with a wrong passphrase: says so beside the form and keeps the address', async () => {
    const page = await browser.newPage();
    await page.goto(app.url);
    await page.getByLabel('University email').fill(DEMO_PEOPLE.member);
    await page.getByLabel('Passphrase', { exact: true }).fill('not this one at all');
    await page.getByRole('button', { name: 'Sign in', exact: true }).click();

    await page.getByRole('alert').waitFor();

    expect(await page.getByLabel('University email').inputValue()).toBe(DEMO_PEOPLE.member);
    await page.close();
  });

  test('as a member of another team: the problem does not exist', async () => {
    const { page, context } = await person(browser, app.url, 'sunniva.dahl@gannet.example');

    const answer = await page.request.get(`${app.url}/api/teams/tern-rock/problems/1`);

    expect(answer.status()).toBe(404);
    await context.close();
  });
});

describe('inviting', () => {
  test('from the captain’s form to the mail to a browser that was never here: the team has one more', async () => {
    const { page, context } = await person(browser, app.url, DEMO_PEOPLE.captain);
    await page.goto(`${app.url}/team/tern-rock/people`);
    const form = page.getByRole('form', { name: 'Invite' });
    await form.getByLabel('Name').fill('Tove Braaten');
    await form.getByLabel('University email').fill('tove.braaten@skerry.example');
    await form.getByRole('button', { name: 'Invite' }).click();
    await page.getByRole('button', { name: 'Withdraw the invitation of Tove Braaten' }).waitFor();
    const mailTo = () =>
      readMailFolder(app.data).find((mail) => mail.includes('tove.braaten@skerry.example')) ?? '';
    await expect.poll(mailTo).toContain('/join/');

    const fresh = await browser.newContext();
    const tove = await fresh.newPage();
    await tove.goto(app.url + linkIn(mailTo()));
    await tove.getByRole('heading', { level: 1, name: 'Join Tern Rock' }).waitFor();
    await tove.getByLabel('New passphrase').fill('a tray under the can');
    await tove.getByRole('button', { name: 'Join Tern Rock' }).click();

    await tove.waitForURL(`${app.url}/team/tern-rock`);
    await page.getByRole('rowheader', { name: /Tove Braaten/ }).waitFor();
    expect(await page.getByRole('button', { name: 'Withdraw the invitation of Tove Braaten' }).count()).toBe(
      0,
    );
    await tove.goto(`${app.url}/team/tern-rock/people`);
    await tove.getByRole('rowheader', { name: /Tove Braaten/ }).waitFor();
    expect(await tove.getByRole('form', { name: 'Invite' }).count()).toBe(0);
    await Promise.all([context.close(), fresh.close()]);
  });

  test('a forgotten passphrase, from sign-in by mail to signing in again: the new one lets in', async () => {
    const context = await browser.newContext();
    const page = await context.newPage();
    await page.goto(app.url);
    await page.getByRole('link', { name: 'Forgotten passphrase?' }).click();
    // The sign-in screen has a field of a like name until the next one is there.
    await page.getByRole('heading', { level: 1, name: 'Forgotten your passphrase?' }).waitFor();
    await page.getByLabel('Email', { exact: true }).fill(DEMO_PEOPLE.advisor);
    await page.getByRole('button', { name: 'Mail me the link' }).click();
    await page.getByRole('heading', { level: 1, name: 'Look into your mail' }).waitFor();
    const mailTo = () => readMailFolder(app.data).find((mail) => mail.includes('/reset/')) ?? '';
    await expect.poll(mailTo).toContain('/reset/');

    await page.goto(app.url + linkIn(mailTo()));
    await page.getByLabel('New passphrase').fill('a lamp above the beaker');
    await page.getByRole('button', { name: 'Set the passphrase' }).click();
    await page.getByRole('heading', { level: 1, name: 'Your passphrase is new' }).waitFor();
    await page.getByRole('link', { name: 'Go to sign in' }).click();
    await page.getByLabel('University email').fill(DEMO_PEOPLE.advisor);
    await page.getByLabel('Passphrase', { exact: true }).fill('a lamp above the beaker');
    await page.getByRole('button', { name: 'Sign in', exact: true }).click();

    await page.waitForURL(`${app.url}/team/tern-rock`);
    await context.close();
  });
});
