/** Every screen, in light and dark, wide and narrow: axe finds nothing, and no page scrolls sideways. */
import AxeBuilder from '@axe-core/playwright';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import type { Browser, Page } from 'playwright-core';
import { DEMO_COPY_TOKEN } from '#server/database/seeders/demo/seed-copy.ts';
import { DEMO_PEOPLE, openBrowser, person } from '#tests/support/browser.ts';
import { startApp, type RunningApp } from '#tests/support/running-app.ts';

const P = '/team/tern-rock/problem/1';
const SCREENS = [
  ['Season', '/team/tern-rock'],
  ['Trials', `${P}/trials`],
  ['Model', `${P}/model`],
  ['Claim sheet', `${P}/model/claims`],
  ['Report', `${P}/report`],
  ['Fights and events', '/team/tern-rock/fights'],
  ['Leak check', `${P}/leaks`],
  ['Leak check, first day', '/team/tern-rock/problem/12/leaks'],
  ['Report, first day', '/team/tern-rock/problem/12/report'],
  ['Trials, none yet', '/team/tern-rock/problem/12/trials'],
  ['Model, none yet', '/team/tern-rock/problem/12/model'],
  ['Editions', `${P}/editions`],
  ['Edition beside the draft', `${P}/editions/2`],
  ['Edition beside another', `${P}/editions/2?beside=1`],
  ['Editions, none yet', '/team/tern-rock/problem/12/editions'],
  ['Settings', `${P}/settings`],
  ['Copies', '/team/tern-rock/copies'],
  ['People', '/team/tern-rock/people'],
  ['New problem', '/team/tern-rock/new-problem'],
  ['Account', '/account'],
  ['An address that leads nowhere', '/team/tern-rock/problem/77/report'],
] as const;

let app: RunningApp;
let browser: Browser;
let wide: Page;
let narrow: Page;
beforeAll(async () => {
  [app, browser] = await Promise.all([startApp(), openBrowser()]);
  ({ page: wide } = await person(browser, app.url, DEMO_PEOPLE.captain));
  ({ page: narrow } = await person(browser, app.url, DEMO_PEOPLE.captain, {
    viewport: { width: 390, height: 844 },
  }));
});
afterAll(async () => {
  await browser.close();
  await app.stop();
});

async function findings(
  page: Page,
  path: string,
  theme: 'light' | 'dark',
  prepare?: () => Promise<void>,
): Promise<string[]> {
  await page.emulateMedia({ reducedMotion: 'reduce', colorScheme: theme });
  await page.goto(app.url + path);
  await page.locator('main').waitFor();
  await page.waitForLoadState('networkidle');
  await expect.poll(() => page.evaluate(() => document.documentElement.dataset.theme ?? 'light')).toBe(theme);
  await prepare?.();
  const { violations } = await new AxeBuilder({ page })
    .withTags(['wcag2a', 'wcag2aa', 'wcag21a', 'wcag21aa', 'wcag22aa'])
    .analyze();
  const sideways = await page.evaluate(() => document.documentElement.scrollWidth > window.innerWidth + 1);
  return [
    ...violations.map(({ id, nodes }) => `${id}: ${nodes.map(({ html }) => html.slice(0, 160)).join(' | ')}`),
    ...(sideways ? ['the page scrolls sideways'] : []),
  ];
}

describe.each(['light', 'dark'] as const)('in %s', (theme) => {
  test.each(SCREENS)('%s, 1440 px wide', async (_name, path) => {
    expect(await findings(wide, path, theme)).toEqual([]);
  });

  test.each(SCREENS)('%s, 390 px wide', async (_name, path) => {
    expect(await findings(narrow, path, theme)).toEqual([]);
  });

  test.each([1440, 390])(
    'A lent copy and an address that opens none, signed out, %i px wide',
    async (width) => {
      const context = await browser.newContext({ viewport: { width, height: 844 } });
      const page = await context.newPage();
      expect(await findings(page, `/copy/${DEMO_COPY_TOKEN}`, theme)).toEqual([]);
      expect(await findings(page, '/copy/none', theme)).toEqual([]);
      await context.close();
    },
  );

  test.each([1440, 390])('Report with a note being written, as the advisor, %i px wide', async (width) => {
    const { page, context } = await person(browser, app.url, DEMO_PEOPLE.advisor, {
      viewport: { width, height: 844 },
    });
    const write = async () => {
      await page.getByRole('article', { name: /^Note 4,/ }).waitFor();
      await page.getByRole('button', { name: 'Settle note 4' }).click();
      await page.getByRole('radio', { name: 'Held to' }).click();
      await page.getByRole('button', { name: 'Write a note' }).click();
      await page.getByLabel('Your note').waitFor();
    };
    expect(await findings(page, `${P}/report`, theme, write)).toEqual([]);
    await context.close();
  });

  test.each([1440, 390])('Ways in and links that open nothing, signed out, %i px wide', async (width) => {
    const context = await browser.newContext({ viewport: { width, height: 844 } });
    const page = await context.newPage();
    for (const path of ['/forgotten', '/reset/none', '/join/none', '/setup/none']) {
      expect(await findings(page, path, theme)).toEqual([]);
    }
    await context.close();
  });

  test('Sign in', async () => {
    const context = await browser.newContext();
    expect(await findings(await context.newPage(), '/', theme)).toEqual([]);
    await context.close();
  });
});
