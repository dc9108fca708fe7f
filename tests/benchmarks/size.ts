/** How much script a browser loads before one can work, compressed; counted in a real browser, workers included. */
import { gzipSync } from 'node:zlib';
import type { BrowserContext, Page } from 'playwright-core';
import { DEMO_PEOPLE, openBrowser, signIn } from '#tests/support/browser.ts';
import { startApp } from '#tests/support/running-app.ts';
import type { Figure } from './run.ts';

const SIGN_IN_KB = 150;
/** What the report needs to be read and written in, all that sign in loads and the worker included. */
const REPORT_KB = 450;
/** The same with the two libraries that come when the first formula and the first chart come near the view. */
const DRAWN_REPORT_KB = 600;

const FIRST_DAY = '/team/tern-rock/problem/12/report';
const FULL = '/team/tern-rock/problem/1/report#4';

export async function benchmarks(): Promise<Figure[]> {
  const [app, browser] = await Promise.all([startApp(), openBrowser()]);
  try {
    const signedOut = await browser.newContext();
    const first = countScripts(signedOut);
    const page = await signedOut.newPage();
    await page.goto(app.url);
    await page.getByRole('button', { name: 'Sign in', exact: true }).waitFor();
    await page.waitForLoadState('networkidle');
    const atSignIn = await first();
    await signIn(page, app.url, DEMO_PEOPLE.member);

    const cookies = await signedOut.storageState();
    const open = async (path: string, isThere: (report: Page) => Promise<void>) => {
      const context = await browser.newContext({ storageState: cookies });
      const all = countScripts(context);
      const report = await context.newPage();
      await report.goto(app.url + path);
      await report.getByRole('textbox', { name: 'Report' }).waitFor();
      await isThere(report);
      await report.waitForLoadState('networkidle');
      return all();
    };
    return [
      figure('script of sign in', atSignIn, SIGN_IN_KB),
      figure('script of the report, in all', await open(FIRST_DAY, async () => undefined), REPORT_KB),
      figure(
        'script of the report with formulas and charts drawn, in all',
        await open(FULL, async (report) => {
          await report.locator('canvas').first().waitFor();
          await report.locator('.katex').first().waitFor();
        }),
        DRAWN_REPORT_KB,
      ),
    ];
  } finally {
    await browser.close();
    await app.stop();
  }
}

/** Notes every script that comes; gives their compressed size in kB. */
function countScripts(context: BrowserContext): () => Promise<number> {
  const scripts = new Map<string, Promise<Buffer>>();
  context.on('response', (response) => {
    if (new URL(response.url()).pathname.endsWith('.js')) scripts.set(response.url(), response.body());
  });
  return async () => {
    const bodies = await Promise.all(scripts.values());
    return bodies.reduce((sum, body) => sum + gzipSync(body).length, 0) / 1000;
  };
}

function figure(name: string, value: number, reach: number): Figure {
  return { name, value, reach, unit: 'kB', ok: value <= reach };
}
