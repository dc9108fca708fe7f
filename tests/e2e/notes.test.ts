/** Margin notes in a real browser: written by the advisor, answered while others edit, settled; never on other words. */
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

async function atReport(email: string, options: Parameters<Browser['newContext']>[0] = {}): Promise<Page> {
  const { page } = await person(browser, app.url, email, options);
  await page.goto(`${app.url}/team/tern-rock/problem/1/report`);
  await page.locator('.report-section').nth(4).waitFor();
  await note(page, 1).waitFor();
  return page;
}

const note = (page: Page, n: number) => page.getByRole('article', { name: new RegExp(`^Note ${n},`) });
const noted = (page: Page) => page.locator('.noted').allInnerTexts();

/** Selects words of the text as a pointer would; the page follows the browser's own selection. */
async function select(page: Page, words: string): Promise<void> {
  await page.evaluate((wanted) => {
    const text = document.querySelector('.report-text');
    if (!text) throw new Error('There is no report.');
    const walker = document.createTreeWalker(text, NodeFilter.SHOW_TEXT);
    for (let node = walker.nextNode(); node; node = walker.nextNode()) {
      const at = node.textContent?.indexOf(wanted) ?? -1;
      if (at < 0) continue;
      node.parentElement?.scrollIntoView({ block: 'center' });
      (node.parentElement?.closest('[contenteditable="true"]') as HTMLElement | null)?.focus();
      document.getSelection()?.setBaseAndExtent(node, at, node, at + wanted.length);
      return;
    }
    throw new Error(`The report does not say "${wanted}".`);
  }, words);
}

async function close(...pages: readonly Page[]): Promise<void> {
  await Promise.all(pages.map((page) => page.context().close()));
}

describe('margin notes', () => {
  test('when the advisor writes, a member answers while writing above, and the advisor settles: all see it at its words', async () => {
    const odile = await atReport(DEMO_PEOPLE.advisor);
    const kasimir = await atReport(DEMO_PEOPLE.member);

    await select(odile, 'the moment when the can runs dry');
    await odile.getByRole('button', { name: 'Write a note on this' }).click();
    await odile.getByLabel('Your note').fill('<b>Why</b> not? It is <script>alert(1)</script> the end.');
    await odile.getByRole('button', { name: 'Write note' }).click();

    await note(kasimir, 5).getByText('<b>Why</b> not? It is <script>alert(1)</script> the end.').waitFor();
    await kasimir.locator('section[data-section="Phenomenon"] p').first().click();
    await kasimir.keyboard.press('Home');
    await kasimir.keyboard.type('Written above. ');
    await kasimir.keyboard.press('Enter');
    await note(kasimir, 5).getByRole('button', { name: 'Answer note 5' }).click();
    await kasimir.getByLabel('Our answer to note 5').fill('The task stops there.');
    await kasimir.getByRole('button', { name: 'Answer note', exact: true }).click();

    await note(odile, 5).getByText('The task stops there.').waitFor();
    await expect.poll(() => noted(odile)).toContain('the moment when the can runs dry');
    await note(odile, 5).getByRole('button', { name: 'Settle note 5' }).click();
    await odile.getByRole('button', { name: 'Settle note', exact: true }).click();
    await note(kasimir, 5).getByText('Agreed.').waitFor();
    expect(await note(kasimir, 5).getByRole('button').count()).toBe(0);
    await close(odile, kasimir);
  });

  test('when a paragraph is split before its words: the note stays with them, for the others too', async () => {
    const kasimir = await atReport(DEMO_PEOPLE.member);
    const maren = await atReport(DEMO_PEOPLE.otherMember);

    await select(kasimir, 'What would prove us wrong');
    await kasimir.keyboard.press('ArrowLeft');
    await kasimir.keyboard.press('Enter');

    await expect.poll(() => noted(kasimir)).toContain('What would prove us wrong');
    await expect.poll(() => noted(maren), { timeout: 10_000 }).toContain('What would prove us wrong');
    await close(kasimir, maren);
  });

  test('when its words are deleted and stand elsewhere too: it says so, and does not jump; undone, it is back', async () => {
    const kasimir = await atReport(DEMO_PEOPLE.member);
    const maren = await atReport(DEMO_PEOPLE.otherMember);
    const heading = kasimir.getByText('A term that grows with the length of flight is what is missing.');
    await heading.click();
    await kasimir.keyboard.press('End');
    await kasimir.keyboard.type(' It is drag on the broken jet, we think.');
    await kasimir.waitForTimeout(600);

    await select(kasimir, 'drag on the broken jet');
    await kasimir.keyboard.press('Delete');

    for (const page of [kasimir, maren]) {
      await note(page, 3).getByText('not in the text any more: “drag on the broken jet”').waitFor();
      expect(await noted(page)).not.toContain('drag on the broken jet');
    }
    await kasimir.keyboard.press('Control+z');
    await expect.poll(() => noted(kasimir)).toContain('drag on the broken jet');
    await expect.poll(() => noted(maren)).toContain('drag on the broken jet');
    await close(kasimir, maren);
  });

  test('with keys alone: the advisor names the words and a figure, and writes on each', async () => {
    const odile = await atReport(DEMO_PEOPLE.advisor);
    await odile.getByRole('button', { name: 'Write a note', exact: true }).focus();
    await odile.keyboard.press('Enter');
    await odile.keyboard.press('Tab');
    await odile.keyboard.type('the');
    await odile.keyboard.press('Tab');
    await odile.keyboard.type('How was it kept level?');
    await odile.getByRole('button', { name: 'Write note' }).press('Enter');
    await odile.getByText(/These words stand at \d+ places/).waitFor();
    await odile.getByLabel(/^The words/).fill('a ruled tray that is kept level');
    await odile.getByRole('button', { name: 'Write note' }).press('Enter');
    await odile.getByText('How was it kept level?').waitFor();
    await expect.poll(() => noted(odile)).toContain('a ruled tray that is kept level');

    await odile.getByRole('button', { name: 'Write a note', exact: true }).press('Enter');
    await odile.getByLabel('About').selectOption({ label: 'Figure 1, in Comparison' });
    await odile.getByLabel('Your note').fill('Label the hollow point.');
    await odile.getByRole('button', { name: 'Write note' }).press('Enter');
    await odile.locator('.noted-block').waitFor();
    await odile.getByText('Label the hollow point.').waitFor();
    await close(odile);
  });

  test('at 820 px: a note follows its paragraph, and is answered there', async () => {
    const kasimir = await atReport(DEMO_PEOPLE.member, { viewport: { width: 820, height: 1000 } });

    const inside = kasimir
      .locator('section[data-section="Conclusion"]')
      .getByRole('article', { name: /^Note 4,/ });
    await inside.getByRole('button', { name: 'Answer note 4' }).click();
    await kasimir.getByLabel('Our answer to note 4').fill('Two centimetres, at 55°.');
    await kasimir.getByRole('button', { name: 'Answer note', exact: true }).click();

    await inside.getByText('Two centimetres, at 55°.').waitFor();
    await kasimir.reload();
    await inside.waitFor();
    await expect
      .poll(() => kasimir.locator('.report-text').locator('p', { hasText: 'Two centimetres' }).count())
      .toBe(1);
    await close(kasimir);
  });
});
