/** Logging trials: two people at once, leaving one out, and what happens when the server is away. */
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import type { Browser, Page } from 'playwright-core';
import { DEMO_PEOPLE, openBrowser, person } from '#tests/support/browser.ts';
import { startApp, type RunningApp } from '#tests/support/running-app.ts';

let app: RunningApp;
let browser: Browser;
let kasimir: Page;
let maren: Page;
beforeAll(async () => {
  [app, browser] = await Promise.all([startApp(), openBrowser()]);
  ({ page: kasimir } = await person(browser, app.url, DEMO_PEOPLE.member));
  ({ page: maren } = await person(browser, app.url, DEMO_PEOPLE.otherMember));
  for (const page of [kasimir, maren]) {
    await page.goto(`${app.url}/team/tern-rock/problem/1/trials/B`);
    await page.getByRole('heading', { level: 1, name: 'Trials' }).waitFor();
  }
});
afterAll(async () => {
  await browser.close();
  await app.stop();
});

const row = (page: Page, name: string) => page.locator(`tr#${name}`);

async function log(page: Page, lean: string, range: string): Promise<void> {
  await page.getByLabel('lean of the can, θ', { exact: true }).fill(lean);
  await page.getByLabel('range on the tray, R', { exact: true }).fill(range);
  await page.getByLabel('Uncertainty of range on the tray').fill('0.4');
  await page.getByRole('button', { name: 'Log trial' }).click();
}

describe('trials', () => {
  test('before logging: the bar says what was predicted and how far the reading is from it', async () => {
    await kasimir.getByLabel('lean of the can, θ', { exact: true }).fill('45');
    await kasimir.getByLabel('range on the tray, R', { exact: true }).fill('44.7');

    await expect
      .poll(() => kasimir.getByLabel('The next trial').textContent())
      .toMatch(/Predicted.*\scm, so this reads.*\sshort/);
  });

  test('when two people log at once: each sees the other within a second, and no number is given twice', async () => {
    await Promise.all([log(kasimir, '45', '44.7'), log(maren, '55', '39.6')]);

    for (const page of [kasimir, maren]) {
      await row(page, 'B20').waitFor({ timeout: 3000 });
      await row(page, 'B21').waitFor({ timeout: 1000 });
    }
  });

  test('when a trial is excluded with a reason and brought back: both are seen by everybody', async () => {
    await row(kasimir, 'B19').getByRole('button', { name: /B19/ }).click();
    await kasimir.getByRole('menuitem', { name: 'Exclude, with a reason' }).click();
    await kasimir.getByLabel('Why it is left out').fill('The tray was moved');
    await kasimir.getByRole('button', { name: 'Exclude B19' }).click();

    await row(maren, 'B19').getByText('The tray was moved').waitFor({ timeout: 2000 });
    await row(maren, 'B19').getByRole('button', { name: 'Bring back' }).click();

    await row(kasimir, 'B19').getByText('The tray was moved').waitFor({ state: 'detached', timeout: 2000 });
  });

  test('when a reading cannot be understood: a sentence stands at the field and nothing is lost', async () => {
    await log(kasimir, '45', '1,234.5');

    await kasimir.getByLabel('The next trial').getByRole('alert').first().waitFor();

    expect(await kasimir.getByLabel('range on the tray, R', { exact: true }).inputValue()).toBe('1,234.5');
  });

  test('when the server is away: the trial waits in the browser and is sent when it is back', async () => {
    await app.kill();
    await log(kasimir, '10', '36.2');
    await kasimir.getByText('1 trial not sent yet').waitFor();

    await app.restart();

    await row(kasimir, 'B22').waitFor({ timeout: 20_000 });
    await kasimir.getByText('1 trial not sent yet').waitFor({ state: 'detached' });
  });

  test('when a block is pasted: it is shown as understood before it is logged', async () => {
    await kasimir.getByRole('button', { name: 'Paste rows' }).click();
    await kasimir.getByLabel('Rows copied from a spreadsheet').fill('R (mm)\tθ\n361\t10\n365\t10');
    await kasimir.getByRole('region', { name: 'What is understood' }).getByText('361').waitFor();

    await kasimir.getByRole('button', { name: 'Log 2 trials' }).click();

    await row(kasimir, 'B24').waitFor({ timeout: 3000 });
  });
});
