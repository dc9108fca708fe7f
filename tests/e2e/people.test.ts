/** Who may come in, and what each role finds. */
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import type { Browser } from 'playwright-core';
import { DEMO_PEOPLE, openBrowser, person } from '#tests/support/browser.ts';
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
