/** The whole way by keys alone: the mouse is never used. */
import { afterAll, beforeAll, expect, test } from 'vitest';
import type { Browser, Locator, Page } from 'playwright-core';
import { DEMO_PEOPLE, openBrowser } from '#tests/support/browser.ts';
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

const hasFocus = (place: Locator) => place.evaluate((element) => element === document.activeElement);

/** Tabs on until a place has the focus; where it never does, says what had it instead. */
async function tabTo(page: Page, place: Locator, key = 'Tab', most = 60): Promise<void> {
  await place.waitFor();
  const passed: string[] = [];
  for (let i = 0; i < most; i += 1) {
    if (await hasFocus(place)) return;
    await page.keyboard.press(key);
    passed.push(
      await page.evaluate(() => {
        const active = document.activeElement;
        return active?.getAttribute('aria-label') ?? active?.textContent?.slice(0, 30) ?? '';
      }),
    );
  }
  throw new Error(`tabTo: ${String(place)} was not reached; passed ${passed.join(' | ')}`);
}

test('sign in, log a trial, tie a value, open its card, and walk to model and claims, by keys alone', async () => {
  const context = await browser.newContext({ viewport: { width: 1440, height: 900 } });
  const page = await context.newPage();
  await page.goto(app.url);

  // Sign in.
  await tabTo(page, page.getByLabel('University email'));
  await page.keyboard.type(DEMO_PEOPLE.member);
  await tabTo(page, page.getByLabel('Passphrase', { exact: true }));
  await page.keyboard.type('brass ruler and level');
  await page.keyboard.press('Enter');
  await page.waitForURL(/\/team\/tern-rock$/);

  // Season, to the problem: it opens at Trials.
  await tabTo(page, page.getByRole('link', { name: 'Leaning Spout', exact: true }).last());
  await page.keyboard.press('Enter');
  await page.waitForURL(/\/problem\/1\/trials/);
  await page.getByRole('heading', { level: 1, name: 'Trials' }).waitFor();

  // F6 goes to the entry bar; Enter logs and gives the caret back to the reading.
  const reading = page.getByLabel('range on the tray, R', { exact: true });
  await reading.waitFor();
  await page.keyboard.press('F6');
  await page.keyboard.press('F6');
  await tabTo(page, reading, 'Tab', 6);
  await page.keyboard.type('39.7');
  await page.keyboard.press('Enter');
  await page.locator('tr#B20').waitFor();
  await expect.poll(() => reading.inputValue()).toBe('');
  expect(await hasFocus(reading)).toBe(true);

  // Digits go to the stations once no field has the focus.
  await page.keyboard.press('Shift+F6');
  await page.keyboard.press('3');
  await page.waitForURL(/\/report/);
  await page.locator('.report-section').nth(4).waitFor();

  // Write at the end of the report and tie a value.
  const text = page.getByRole('textbox', { name: 'Report', exact: true });
  await page.keyboard.press('F6');
  await tabTo(page, text, 'Tab', 20);
  await page.keyboard.press('Control+End');
  await page.keyboard.type(' By keys: R +-');
  await page.getByRole('listbox', { name: /range/ }).waitFor();
  await page.keyboard.press('ArrowDown');
  await page.keyboard.press('Enter');
  const value = page.locator('section[data-section="Conclusion"] .lv').last();
  await expect.poll(() => value.textContent()).toMatch(/\d\d\.\d/);

  // Choose it with an arrow, open its card, close it.
  await page.keyboard.press('ArrowLeft');
  await page.keyboard.press('Enter');
  const card = page.getByRole('dialog', { name: /comes from/ });
  await card.waitFor();
  expect(await card.evaluate((element) => element.contains(document.activeElement))).toBe(true);
  await page.keyboard.press('Escape');
  await card.waitFor({ state: 'detached' });
  await page.getByText(/^Kept \d\d:\d\d$/).waitFor();

  // The model, by the station line; the claims, by their word.
  const stations = page.getByRole('navigation', { name: 'Stations of this problem' });
  const model = stations.getByRole('link', { name: 'Model', exact: true });
  await tabTo(page, model, 'Shift+Tab', 80);
  await page.keyboard.press('Enter');
  await page.waitForURL(/\/model/);
  await tabTo(page, page.getByRole('link', { name: 'Claim sheet' }), 'Tab', 60);
  await page.keyboard.press('Enter');
  await page.waitForURL(/\/model\/claims/);
  await page.getByRole('heading', { level: 1, name: 'Claims' }).waitFor();
  await context.close();
});
