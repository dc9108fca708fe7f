/** Writing the report: together, through a crash, as an advisor, and with numbers that are tied as one writes. */
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import type { Browser, Page } from 'playwright-core';
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

async function atReport(email: string, problem = 1): Promise<Page> {
  const { page } = await person(browser, app.url, email);
  await page.goto(`${app.url}/team/tern-rock/problem/${problem}/report`);
  await page.locator('.report-section').nth(4).waitFor();
  return page;
}

const section = (page: Page, name: string) => page.locator(`section[data-section="${name}"]`);
const text = (page: Page) => page.locator('.report-text');

/** Puts the caret at the end of a section's last paragraph and types there. */
async function typeIn(page: Page, name: string, words: string): Promise<void> {
  await section(page, name).locator('p').last().click();
  await page.keyboard.press('End');
  await page.keyboard.type(words);
}

describe('the report', () => {
  test('when two people write at once: each reads the other, and both are kept', async () => {
    const [kasimir, maren] = await Promise.all([
      atReport(DEMO_PEOPLE.member, 12),
      atReport(DEMO_PEOPLE.otherMember, 12),
    ]);

    await Promise.all([
      typeIn(kasimir, 'Phenomenon', 'The jar slows, although the slope does not.'),
      typeIn(maren, 'Conclusion', 'It stops where the sand says.'),
    ]);

    await expect.poll(() => text(kasimir).textContent()).toContain('where the sand says');
    await expect.poll(() => text(maren).textContent()).toContain('although the slope does not');
    await kasimir.getByText(/^Kept \d\d:\d\d$/).waitFor();
    await Promise.all([kasimir.context().close(), maren.context().close()]);
  });

  test('when the server is killed while one types: nothing that was kept is lost, and what was typed since is sent', async () => {
    const kasimir = await atReport(DEMO_PEOPLE.member, 9);
    await typeIn(kasimir, 'Model', 'Before the crash. ');
    await kasimir.getByText(/^Kept \d\d:\d\d$/).waitFor();
    await kasimir.waitForTimeout(300);

    await app.kill();
    await kasimir.keyboard.type('While it was away. ');
    await kasimir.getByText('Not kept yet; the server is away').waitFor({ timeout: 15_000 });
    await app.restart();

    await kasimir.getByText(/^Kept \d\d:\d\d$/).waitFor({ timeout: 20_000 });
    const maren = await atReport(DEMO_PEOPLE.otherMember, 9);
    await expect
      .poll(() => section(maren, 'Model').textContent())
      .toContain('Before the crash. While it was away.');
    await Promise.all([kasimir.context().close(), maren.context().close()]);
  });

  test('when the session ends while one types: one signs in again in place, and nothing is lost', async () => {
    const kasimir = await atReport(DEMO_PEOPLE.member, 9);
    await kasimir.context().clearCookies();
    await app.kill();
    await app.restart();
    await typeIn(kasimir, 'Experiment', 'Typed without a session. ');

    const dialog = kasimir.getByRole('dialog');
    await dialog.waitFor({ timeout: 20_000 });
    await dialog.getByLabel('Passphrase', { exact: true }).fill('brass ruler and level');
    await dialog.getByRole('button', { name: /sign in/i }).click();

    await dialog.waitFor({ state: 'detached' });
    await kasimir.getByText(/^Kept \d\d:\d\d$/).waitFor({ timeout: 20_000 });
    expect(await section(kasimir, 'Experiment').textContent()).toContain('Typed without a session.');
    await kasimir.context().close();
  });

  test('when a symbol and ± are written: the value that is taken is tied', async () => {
    const kasimir = await atReport(DEMO_PEOPLE.member);
    await typeIn(kasimir, 'Conclusion', ' At 45° we find R +-');
    const list = kasimir.getByRole('listbox', { name: /range/ });
    await list.waitFor();

    await kasimir.keyboard.press('Enter');

    await list.waitFor({ state: 'detached' });
    await expect
      .poll(() => section(kasimir, 'Conclusion').locator('.lv').last().textContent())
      .toMatch(/^4[45]\.\d/);
    await kasimir.context().close();
  });

  test('when a number is pressed: its provenance goes down to the trials, and Escape gives the focus back', async () => {
    const kasimir = await atReport(DEMO_PEOPLE.member);
    const number = section(kasimir, 'Comparison').locator('.lv-measured').first();
    await number.scrollIntoViewIfNeeded();
    await number.focus();
    await kasimir.keyboard.press('Enter');

    const card = kasimir.getByRole('dialog', { name: /comes from/ });
    await card.getByText('B10').first().waitFor();
    await card.getByText(/B11/).first().waitFor();
    await kasimir.keyboard.press('Escape');

    await card.waitFor({ state: 'detached' });
    expect(await number.evaluate((element) => element === document.activeElement)).toBe(true);
    await kasimir.context().close();
  });

  test('as an advisor: it is read, and cannot be typed into', async () => {
    const odile = await atReport(DEMO_PEOPLE.advisor);
    // The chart's own words come with the chart.
    await odile.getByRole('button', { name: 'See as table' }).waitFor();
    const before = await text(odile).textContent();

    await section(odile, 'Phenomenon').locator('p').first().click();
    await odile.keyboard.type('I would say');

    expect(await text(odile).textContent()).toBe(before);
    expect(await odile.getByRole('toolbar', { name: 'Put in' }).count()).toBe(0);
    await odile.context().close();
  });

  test('as a page of an older version: it is refused before it can sync, and says what to do', async () => {
    const { page } = await person(browser, app.url, DEMO_PEOPLE.member);
    const before = await page.request.get(`${app.url}/api/teams/tern-rock/problems/1/report`);
    await page.routeWebSocket(/\/collaboration/, (socket) => {
      const server = socket.connectToServer();
      socket.onMessage((message) => {
        const older = Buffer.from(message as Buffer);
        const at = older.indexOf('schema:1');
        if (at >= 0) older.write('schema:0', at);
        server.send(older);
      });
    });

    await page.goto(`${app.url}/team/tern-rock/problem/1/report`);

    await page.getByText('This page is of another version than the server.').waitFor();
    await page.getByRole('button', { name: 'Load again' }).waitFor();
    const after = await page.request.get(`${app.url}/api/teams/tern-rock/problems/1/report`);
    expect(await after.text()).toBe(await before.text());
    await page.context().close();
  });
});
