/** The leak check in a real browser: it follows the trials, answers dot a jet, and what is mended is plugged. */
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import type { Browser, Page } from 'playwright-core';
import { DEMO_PEOPLE, openBrowser, person } from '#tests/support/browser.ts';
import { startApp, type RunningApp } from '#tests/support/running-app.ts';

const P = '/team/tern-rock/problem/1';

let app: RunningApp;
let browser: Browser;
beforeAll(async () => {
  [app, browser] = await Promise.all([startApp(), openBrowser()]);
});
afterAll(async () => {
  await browser.close();
  await app.stop();
});

async function atLeaks(email: string): Promise<Page> {
  const { page } = await person(browser, app.url, email);
  await page.goto(`${app.url}${P}/leaks`);
  await page.getByRole('heading', { name: 'Where they will press' }).waitFor();
  await page.getByRole('button', { name: /^Your model overshoots/ }).waitFor();
  return page;
}

const item = (page: Page, question: RegExp) =>
  page
    .getByRole('listitem')
    .filter({ has: page.getByRole('button', { name: question, exact: false }) })
    .first();

describe('the leak check', () => {
  test('when a trial is brought back elsewhere: its question is plugged within a second, and the cup counts anew', async () => {
    const maren = await atLeaks(DEMO_PEOPLE.otherMember);
    const { page: kasimir } = await person(browser, app.url, DEMO_PEOPLE.member);
    await kasimir.goto(`${app.url}${P}/trials/B`);
    const row = kasimir.getByRole('row').filter({ hasText: 'B11' });
    await row.waitFor();
    await item(maren, /^Why is B11 missing/)
      .getByText('Excluded trial')
      .waitFor();

    await row.getByRole('button', { name: /Bring back/ }).click();

    await item(maren, /^Why is B11 missing/)
      .getByText('Mended: it is not found any more.')
      .waitFor({ state: 'attached', timeout: 5_000 });
    await kasimir.context().close();
    await maren.context().close();
  });

  test('when a question is answered: the answer stands beneath it for everybody, and one fewer is open', async () => {
    const kasimir = await atLeaks(DEMO_PEOPLE.member);
    const odile = await atLeaks(DEMO_PEOPLE.advisor);
    const before = await kasimir.getByText(/leaks are open/).innerText();

    await item(kasimir, /^You name surface tension/)
      .getByRole('button', { name: /^Answer/ })
      .click();
    await kasimir.keyboard.type('We took 72 mN/m from a table at 20 degrees.');
    await kasimir.getByRole('button', { name: 'Keep the answer' }).click();

    await item(odile, /^You name surface tension/)
      .getByText(/We took 72/)
      .waitFor();
    await expect.poll(() => kasimir.getByText(/leaks? (is|are) open/).innerText()).not.toBe(before);
    expect(await odile.getByRole('button', { name: /^Answer/ }).count()).toBe(0);
    await kasimir.context().close();
    await odile.context().close();
  });

  test('when the dry run is pressed: the hardest question is asked first, with its clock and our answer', async () => {
    const kasimir = await atLeaks(DEMO_PEOPLE.member);

    await kasimir.getByRole('button', { name: 'Dry run of the questions' }).click();

    const run = kasimir.getByRole('region', { name: 'Dry run of the questions' });
    await run.getByRole('heading', { name: /^Your model overshoots/ }).waitFor();
    await run.getByText(/s left/).waitFor();
    await run.getByRole('button', { name: 'Show our answer' }).click();
    await run.getByText('No answer is prepared yet.').waitFor();
    await run.getByRole('button', { name: 'Next question' }).click();
    await run.getByText(/Question 2 of/).waitFor();
    await run.getByRole('button', { name: 'Stop' }).click();
    await kasimir.getByRole('button', { name: /^Your model overshoots/ }).waitFor();
    await kasimir.context().close();
  });
});
