/** Freezing in a real browser: the question, the seal, the edition beside the draft, and a PDF that never changes. */
import { createHash } from 'node:crypto';
import { readFile } from 'node:fs/promises';
import { afterAll, beforeAll, expect, test } from 'vitest';
import type { Browser, Page } from 'playwright-core';
import { DEMO_PEOPLE, openBrowser, person } from '#tests/support/browser.ts';
import { startApp, type RunningApp } from '#tests/support/running-app.ts';

const EDITIONS = '/team/tern-rock/problem/1/editions';

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

async function savedPdf(page: Page, n: number): Promise<string> {
  const download = page.waitForEvent('download');
  await page.getByRole('link', { name: `Print or save PDF of edition ${n}` }).click();
  const file = await download;
  expect(file.suggestedFilename()).toBe(`leaning-spout-edition-${n}.pdf`);
  return createHash('sha256')
    .update(await readFile(await file.path()))
    .digest('hex');
}

test('the captain, when freezing: the edition stands under its seal, and another person sees it at once', async () => {
  const { page: advisor, context } = await person(browser, app.url, DEMO_PEOPLE.advisor);
  await advisor.goto(app.url + EDITIONS);
  await advisor.getByText('Ines Farrow freezes editions, as captain.').waitFor();
  await captain.goto(app.url + EDITIONS);

  await captain.getByRole('button', { name: 'Freeze edition 3' }).click();
  const dialog = captain.getByRole('dialog', { name: 'Freeze edition 3?' });
  await dialog.getByLabel('Note').fill('For the second fight.');
  await dialog.getByRole('button', { name: 'Freeze edition 3' }).click();

  await captain.getByRole('img', { name: 'Seal of edition 3' }).waitFor();
  await captain.getByText('Nothing has moved since then.').waitFor();
  await advisor.getByText('For the second fight.').waitFor();
  expect(await captain.getByRole('button', { name: 'Freeze edition 4' }).count()).toBe(1);
  await context.close();
});

test('a PDF, when saved twice: is the same file, also after the server was restarted', async () => {
  await captain.goto(app.url + EDITIONS);
  const first = await savedPdf(captain, 1);
  const frozen = await savedPdf(captain, 3);

  await app.kill();
  await app.restart();
  await captain.goto(app.url + EDITIONS);

  expect(await savedPdf(captain, 1)).toBe(first);
  expect(await savedPdf(captain, 3)).toBe(frozen);
});

test('an edition, when laid beside the draft and beside another: tells what moved in numbers and in words', async () => {
  await captain.goto(app.url + EDITIONS);

  await captain.getByRole('link', { name: 'Lay beside the draft: edition 2' }).click();
  const draft = captain.getByRole('region', { name: 'What moved from edition 2 to the draft' });
  await draft.getByText('7 trials logged: B13 to B19.').waitFor();
  await draft.locator('ins').first().waitFor();
  await captain.getByLabel('Edition 2 laid beside').selectOption({ label: 'edition 1' });

  const editions = captain.getByRole('region', { name: 'What moved from edition 1 to edition 2' });
  await editions.getByText('12 trials logged: B1 to B12.').waitFor();
  expect(new URL(captain.url()).search).toBe('?beside=1');
});

test('the print address of an edition, when opened: is its PDF', async () => {
  const answer = await captain.request.get(
    `${app.url}/api/teams/tern-rock/problems/1/editions/1/report.pdf?show`,
  );

  expect(answer.headers()['content-disposition']).toBe('inline; filename="leaning-spout-edition-1.pdf"');
  const opened = captain.waitForRequest(/editions\/1\/report\.pdf\?show$/);
  await captain.goto(`${app.url}${EDITIONS}/1/print`).catch(() => undefined);
  expect((await opened).resourceType()).toBe('document');
});
