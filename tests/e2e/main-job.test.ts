/** The main job from end to end: a trial is logged, and everything that rests on it follows, down to the PDF. */
import { readFileSync } from 'node:fs';
import { afterAll, beforeAll, expect, test } from 'vitest';
import type { Browser, Page } from 'playwright-core';
import { DEMO_PEOPLE, openBrowser, person } from '#tests/support/browser.ts';
import { startApp, type RunningApp } from '#tests/support/running-app.ts';
import { readPdf } from '#tests/server/rendering/read-pdf.ts';

const WITHIN_A_SECOND = { timeout: 1000 };
let app: RunningApp;
let browser: Browser;
beforeAll(async () => {
  [app, browser] = await Promise.all([startApp(), openBrowser()]);
});
afterAll(async () => {
  await browser.close();
  await app.stop();
});

const comparison = (page: Page) => page.locator('section[data-section="Comparison"]');
const measured = (page: Page) => comparison(page).locator('.lv-measured').first();
const claim = (page: Page, n: number) => page.locator('.report-claim').filter({ hasText: `Claim ${n}` });
const documentOf = async (page: Page) =>
  JSON.stringify(
    (
      (await (await page.request.get(`${app.url}/api/teams/tern-rock/problems/1/report`)).json()) as {
        document: unknown;
      }
    ).document,
  );

test('a trial logged at 38 degrees: number, formula, chart, verdict and PDF follow, and the document does not change', async () => {
  const { page: report, context } = await person(browser, app.url, DEMO_PEOPLE.member);
  const trials = await context.newPage();
  await report.goto(`${app.url}/team/tern-rock/problem/1/report`);
  await trials.goto(`${app.url}/team/tern-rock/problem/1/trials/B`);
  await expect.poll(() => measured(report).textContent()).toBe('46.4\u00a0±\u00a00.3\u00a0cm');
  await comparison(report).scrollIntoViewIfNeeded();
  await comparison(report).getByRole('button', { name: 'See as table' }).click();
  const chartRow = comparison(report).getByRole('row').filter({ hasText: '38' }).first();
  const chartBefore = await chartRow.textContent();
  await expect.poll(() => claim(report, 3).textContent()).toContain('Leaks');
  const documentBefore = await documentOf(report);

  await trials.getByLabel('lean of the can, θ', { exact: true }).fill('38');
  await trials.getByLabel('range on the tray, R', { exact: true }).fill('47.9');
  await trials.getByLabel('Uncertainty of range on the tray').fill('0.4');
  await trials.getByRole('button', { name: 'Log trial' }).click();
  await trials.locator('tr#B20').waitFor();

  await expect
    .poll(() => measured(report).textContent(), WITHIN_A_SECOND)
    .toBe('46.8\u00a0±\u00a00.4\u00a0cm');
  await expect.poll(() => claim(report, 3).textContent(), WITHIN_A_SECOND).toContain('Holds');
  await expect.poll(() => chartRow.textContent(), WITHIN_A_SECOND).not.toBe(chartBefore);
  expect(await documentOf(report)).toBe(documentBefore);

  const [download] = await Promise.all([
    report.waitForEvent('download', { timeout: 30_000 }),
    report.getByRole('button', { name: 'Download PDF' }).click(),
  ]);
  const { text } = await readPdf(readFileSync(await download.path()));
  expect(text.replaceAll('\u00a0', ' ')).toContain('46.8 ± 0.4 cm');
  await context.close();
});

test('a trial of the series that the coefficient is fitted to: the formula’s numbers follow', async () => {
  const { page: report, context } = await person(browser, app.url, DEMO_PEOPLE.member);
  await report.goto(`${app.url}/team/tern-rock/problem/1/report#2`);
  const worked = report.locator('.report-formula-worked').first();
  await worked.waitFor();
  await worked.scrollIntoViewIfNeeded();
  await expect.poll(() => worked.textContent()).toContain('47.9');
  const before = await worked.textContent();
  const trials = await context.newPage();
  await trials.goto(`${app.url}/team/tern-rock/problem/1/trials/A`);

  for (const range of ['31.2', '31.4', '31.3']) {
    await trials.getByLabel('head above the spout, h', { exact: true }).fill('20.0');
    await trials.getByLabel('range on the tray, R', { exact: true }).fill(range);
    await trials.getByLabel('Uncertainty of range on the tray').fill('0.4');
    await trials.getByRole('button', { name: 'Log trial' }).click();
    await expect.poll(() => trials.getByLabel('range on the tray, R', { exact: true }).inputValue()).toBe('');
  }

  await expect.poll(() => worked.textContent(), { timeout: 2000 }).not.toBe(before);
  await context.close();
});
