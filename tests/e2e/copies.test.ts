/** The evening before: freeze, lend, read signed out, open where a number comes from, question, take back. */
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import type { Browser, Page } from 'playwright-core';
import { DEMO_PEOPLE, openBrowser, person } from '#tests/support/browser.ts';
import { startApp, type RunningApp } from '#tests/support/running-app.ts';

let app: RunningApp;
let browser: Browser;
let captain: Page;
beforeAll(async () => {
  [app, browser] = await Promise.all([startApp(), openBrowser()]);
  ({ page: captain } = await person(browser, app.url, DEMO_PEOPLE.captain));
});
afterAll(async () => {
  await browser.close();
  await app.stop();
});

async function stranger(address: string): Promise<Page> {
  const context = await browser.newContext({ viewport: { width: 1440, height: 900 } });
  const page = await context.newPage();
  await page.goto(address);
  return page;
}

/** Lends Leaning Spout on the page of copies, and gives the address that is told once. */
async function lend(recipient: string, passphrase = ''): Promise<string> {
  await captain.goto(`${app.url}/team/tern-rock/copies`);
  await captain.getByRole('button', { name: 'Lend Leaning Spout' }).click();
  const dialog = captain.getByRole('dialog');
  await dialog.getByLabel('To whom').fill(recipient);
  await dialog.getByLabel('Passphrase, if you want one').fill(passphrase);
  await dialog.getByRole('button', { name: 'Lend the edition' }).click();
  const address = await dialog.getByLabel('Address').inputValue();
  await dialog.getByRole('button', { name: 'Done' }).click();
  return address;
}

test(
  'the evening before: lent, read without an account, questioned and taken back',
  { timeout: 90_000 },
  async () => {
    const address = await lend('Long Skerry');
    await captain
      .getByText(/opponent, not opened yet/)
      .first()
      .waitFor();

    const reader = await stranger(address);
    await reader.getByText('Opponent copy, edition 2').waitFor();
    await reader.locator('.report-text .lv').first().click();
    await reader.getByRole('dialog', { name: /^Where .* comes from$/ }).waitFor();
    expect(await reader.getByText('Go to trials').count()).toBe(0);
    await reader.keyboard.press('Escape');

    await reader.getByLabel('Key', { exact: true }).fill('cormorants dry their wings');
    await reader.getByRole('button', { name: 'Set the key' }).click();
    await reader.getByRole('button', { name: 'Write a question' }).click();
    await reader.getByRole('textbox', { name: 'New question' }).fill('Why call it a model of range?');
    await reader.getByLabel('About').selectOption({ label: 'Comparison' });
    await reader.getByLabel('Time', { exact: true }).fill('45');
    await reader.getByRole('button', { name: 'Keep question' }).click();
    await reader.getByRole('button', { name: /Question 1: Why call it/ }).waitFor();
    await reader.getByText('1:15 left').waitFor();

    await reader.getByRole('slider', { name: 'Time of question 1' }).press('ArrowRight');
    await reader.getByText('1:10 left').waitFor();

    await captain.reload();
    await captain
      .getByText(/opponent, opened once/)
      .first()
      .waitFor();
    await captain.getByRole('button', { name: 'Take back from Long Skerry' }).click();
    await captain.getByRole('button', { name: 'Take back', exact: true }).click();
    await captain
      .getByText(/taken back/)
      .first()
      .waitFor();
    expect(await captain.getByText('Why call it a model of range?').count()).toBe(0);

    await reader.getByRole('heading', { name: 'This copy is closed' }).waitFor({ timeout: 30_000 });
    expect(await reader.getByText('Leaning Spout').count()).toBe(0);
    await reader.getByText('Why call it a model of range?').waitFor();
  },
);

test(
  'a passage that is marked: is underlined with the number of its question',
  { timeout: 60_000 },
  async () => {
    const reader = await stranger(await lend('Low Skerry'));
    await reader.getByLabel('Key', { exact: true }).fill('terns nest on the skerry');
    await reader.getByRole('button', { name: 'Set the key' }).click();
    await reader.getByRole('button', { name: 'Write a question' }).waitFor();
    await reader.locator('.report-text p').first().click({ clickCount: 3 });
    await reader.getByRole('button', { name: /^Ask about/ }).click();
    await reader.getByRole('textbox', { name: 'New question' }).fill('Which hole is meant?');
    await reader.getByRole('button', { name: 'Keep question' }).click();

    await reader.getByRole('button', { name: /Question 1: Which hole/ }).waitFor();
    expect(await reader.locator('.asked').count()).toBeGreaterThan(0);
    expect(await reader.locator('.asked-number').first().textContent()).toBe('1');
  },
);

describe('who may not', () => {
  test('a reporter with the address: reads their own report, and is told that the questions are not theirs', async () => {
    const address = await lend('Cormorant Head');
    const { page, context } = await person(browser, app.url, DEMO_PEOPLE.member);
    await page.goto(address);

    await page.getByText(/Your own team lent this copy/).waitFor();
    expect(await page.getByText('Our questions').count()).toBe(0);
    await context.close();
  });

  test('a copy with a passphrase: opens with it alone', { timeout: 60_000 }, async () => {
    const reader = await stranger(await lend('Long Skerry', 'north wind at noon'));
    await reader.getByLabel('Passphrase').fill('south wind at noon');
    await reader.getByRole('button', { name: 'Open the copy' }).click();
    await reader.getByText('This is not the passphrase of this copy.').waitFor();
    await reader.getByLabel('Passphrase').fill('north wind at noon');
    await reader.getByRole('button', { name: 'Open the copy' }).click();
    await reader.getByText('Opponent copy, edition 2').waitFor();
  });

  test('an address that opens nothing: says so, and offers what was noted there', async () => {
    const reader = await stranger(`${app.url}/copy/no-such-copy`);
    await reader.getByRole('heading', { name: 'No copy is open here' }).waitFor();
    await reader.getByRole('heading', { name: 'Did you write questions here?' }).waitFor();
  });

  test('the demonstration, where people sign in: offers a lent copy to read', async () => {
    const reader = await stranger(app.url);
    await reader.getByRole('link', { name: 'read a lent copy' }).click();
    await reader.getByText('Opponent copy, edition 2').waitFor();
  });
});
