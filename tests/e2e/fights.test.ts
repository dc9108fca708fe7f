/** Fights and events in a real browser: the captain sets them, and the others see it at once. */
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import type { Browser } from 'playwright-core';
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

async function atFights(email: string) {
  const { page } = await person(browser, app.url, email);
  await page.getByRole('link', { name: 'Fights and events' }).click();
  await page.getByRole('heading', { name: 'Fights and events' }).waitFor();
  await page.getByRole('heading', { name: 'Fight 2' }).waitFor();
  return page;
}

describe('fights', () => {
  test('when the captain adds one: the member sees it, with who takes the stage, and may not change it', async () => {
    const ines = await atFights(DEMO_PEOPLE.captain);
    const maren = await atFights(DEMO_PEOPLE.otherMember);

    await ines.getByRole('button', { name: 'Add a fight' }).click();
    await ines.getByLabel('Fight', { exact: true }).fill('Friendly');
    await ines.getByLabel('Day and time').fill('2027-02-01T10:00');
    await ines.getByRole('button', { name: 'Add a stage' }).click();
    await ines.getByLabel('Problem').selectOption({ label: '6 Braked Magnet' });
    await ines.getByLabel('The other team').fill('Low Skerry');
    await ines.getByLabel('Takes the stage').selectOption({ label: 'Petra Abiola' });
    await ines.getByRole('button', { name: 'Keep the fight' }).click();

    await maren
      .getByText('In stage 1 we report Braked Magnet to Low Skerry; Petra Abiola takes the stage.')
      .waitFor({ timeout: 5_000 });
    expect(await maren.getByRole('button', { name: /^Change|^Add a fight/ }).count()).toBe(0);
    await ines.context().close();
    await maren.context().close();
  });

  test('when a person takes the stage more often than the event allows: says so, and keeps what was typed', async () => {
    const ines = await atFights(DEMO_PEOPLE.captain);
    await ines.getByRole('button', { name: 'Change Fight 2' }).click();
    const stages = ines.getByRole('group', { name: /^Stage / });
    const count = await stages.count();
    for (let i = 0; i < count; i++) {
      await stages.nth(i).getByLabel('Takes the stage').selectOption({ label: 'Petra Abiola' });
    }

    await ines.getByRole('button', { name: 'Keep the fight' }).click();

    await ines
      .getByText(/Petra Abiola/)
      .filter({ hasText: /stage/ })
      .first()
      .waitFor();
    await ines.getByRole('alert').first().waitFor();
    expect(await stages.count()).toBe(count);
    await ines.context().close();
  });

  test('when two blocks of an event overlap: says which, and keeps nothing', async () => {
    const ines = await atFights(DEMO_PEOPLE.captain);
    await ines.getByRole('button', { name: 'Change Example event A' }).click();
    await ines.getByRole('group', { name: 'Block 2' }).getByLabel('From minute').fill('1');

    await ines.getByRole('button', { name: 'Keep the event' }).click();

    await ines.getByText(/lasts to minute 2, but “Reporter prepares” begins at minute 1/).waitFor();
    await ines.context().close();
  });
});
