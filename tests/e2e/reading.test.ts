/** Reading and shaping the report: what moved since, folding, links, and typed tables, all from the sill's words. */
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

const section = (page: Page, name: string) => page.locator(`section[data-section="${name}"]`);

async function openReport(page: Page, problem: number): Promise<void> {
  await page.goto(`${app.url}/team/tern-rock/problem/${problem}/report`);
  await page.locator('.report-section').nth(4).waitFor();
}

async function takeFromSill(page: Page, kind: string, words: string): Promise<void> {
  await page.getByRole('toolbar', { name: 'Put in' }).getByRole('button', { name: kind }).click();
  await page.getByRole('combobox', { name: `${kind}, which?` }).fill(words);
  await page.keyboard.press('Enter');
}

describe('the report', () => {
  test('when a number moves after one has read it: the old value is struck until one comes to its line', async () => {
    const { page, context } = await person(browser, app.url, DEMO_PEOPLE.member);
    await openReport(page, 1);
    const mean = section(page, 'Comparison').locator('.lv-measured').first();
    await mean.scrollIntoViewIfNeeded();
    await expect.poll(() => mean.textContent()).toContain('46.4');
    await page.waitForTimeout(300);

    const trials = await context.newPage();
    await trials.goto(`${app.url}/team/tern-rock/problem/1/trials/B`);
    await trials.getByLabel('lean of the can, θ', { exact: true }).fill('38');
    await trials.getByLabel('range on the tray, R', { exact: true }).fill('47.9');
    await trials.getByLabel('Uncertainty of range on the tray').fill('0.4');
    await trials.getByRole('button', { name: 'Log trial' }).click();
    await expect.poll(() => mean.getAttribute('aria-label')).toMatch(/moved from 46\.4/);

    await openReport(page, 1);
    await expect.poll(() => mean.getAttribute('data-before')).toContain('46.4');
    await section(page, 'Comparison')
      .locator('p', { has: page.locator('.lv-measured') })
      .first()
      .click({ position: { x: 4, y: 8 } });

    await expect.poll(() => mean.getAttribute('data-before')).toBeNull();
    await openReport(page, 1);
    await expect.poll(() => mean.textContent()).toContain('46.8');
    expect(await mean.getAttribute('data-before')).toBeNull();
    await context.close();
  });

  test('when a section is folded: it says what it holds, stays folded, and unfolds for the caret', async () => {
    const { page, context } = await person(browser, app.url, DEMO_PEOPLE.member);
    await openReport(page, 1);
    const experiment = section(page, 'Experiment');
    await experiment.getByRole('button', { name: 'Fold', exact: true }).focus();
    await page.keyboard.press('Enter');

    await experiment.getByText('folded: 3 paragraphs and 1 table').waitFor();
    expect(await experiment.locator('p').first().isVisible()).toBe(false);

    await openReport(page, 1);
    await experiment.getByText('folded: 3 paragraphs and 1 table').waitFor();
    await experiment.getByRole('button', { name: 'Unfold' }).click();
    await experiment.locator('p').first().waitFor();
    await context.close();
  });

  test('when chosen words are made a link: it leads there, is changed, and is taken off again', async () => {
    const { page, context } = await person(browser, app.url, DEMO_PEOPLE.member);
    await openReport(page, 12);
    await section(page, 'Model').locator('p').first().click();
    await page.keyboard.type('Sand flows');
    await page.keyboard.press('Shift+Home');
    await takeFromSill(page, 'Line', 'link');
    const field = page.getByRole('dialog', { name: 'Where the link leads' }).getByRole('textbox');
    await field.fill('javascript:alert(1)');
    await page.keyboard.press('Enter');
    await page.getByText(/A link leads to the web/).waitFor();
    await field.fill('/team/tern-rock');
    await page.keyboard.press('Enter');

    const link = section(page, 'Model').locator('a');
    await expect.poll(() => link.getAttribute('href')).toBe(`${app.url}/team/tern-rock`);
    await takeFromSill(page, 'Line', 'change where');
    await field.fill('skerry.example');
    await page.keyboard.press('Enter');
    await expect.poll(() => link.getAttribute('href')).toBe('https://skerry.example');
    await takeFromSill(page, 'Line', 'no link');
    await link.waitFor({ state: 'detached' });
    expect(await section(page, 'Model').locator('p').first().textContent()).toBe('Sand flows');
    await context.close();
  });

  test('when the caret is in a typed table: the sill adds and takes out rows and columns', async () => {
    const { page, context } = await person(browser, app.url, DEMO_PEOPLE.member);
    await openReport(page, 12);
    await section(page, 'Experiment').locator('p').first().click();
    await takeFromSill(page, 'Table', 'typed');
    const table = section(page, 'Experiment').locator('table');
    await table.locator('td').first().click();
    const size = async () => [await table.locator('tr').count(), await table.locator('th').count()];
    expect(await size()).toEqual([3, 3]);

    await takeFromSill(page, 'Table', 'row below');
    await takeFromSill(page, 'Table', 'column after');
    await expect.poll(size).toEqual([4, 4]);
    await takeFromSill(page, 'Table', 'this row out');
    await takeFromSill(page, 'Table', 'this column out');
    await expect.poll(size).toEqual([3, 3]);
    await takeFromSill(page, 'Table', 'whole table');
    await table.waitFor({ state: 'detached' });
    await context.close();
  });
});
