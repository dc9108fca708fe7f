import { chromium, type Browser, type BrowserContext, type Page } from 'playwright-core';

/** The installed Chromium, without its background traffic. */
export function openBrowser(): Promise<Browser> {
  return chromium.launch({
    executablePath: process.env.CHROMIUM_PATH ?? '/usr/bin/chromium',
    chromiumSandbox: false,
    args: [
      '--disable-gpu',
      '--disable-quic',
      '--no-first-run',
      '--disable-background-networking',
      '--disable-component-update',
      '--disable-sync',
    ],
  });
}

export const DEMO_PEOPLE = {
  captain: 'ines.farrow@skerry.example',
  member: 'kasimir.lund@skerry.example',
  otherMember: 'maren.tove@skerry.example',
  advisor: 'odile.marsk@skerry.example',
} as const;

/** Signs in through the screen, as a person does, with the passphrase that the demonstration offers. */
export async function signIn(page: Page, url: string, email: string): Promise<void> {
  const health = await page.request.get(new URL('/api/health', url).href);
  const { demo } = (await health.json()) as { demo: { email: string; passphrase: string }[] };
  const passphrase = demo.find((person) => person.email === email)?.passphrase;
  if (!passphrase) throw new Error(`The demonstration has no sign-in for ${email}.`);
  await page.goto(url);
  await page.getByLabel('University email').fill(email);
  await page.getByLabel('Passphrase', { exact: true }).fill(passphrase);
  await page.getByRole('button', { name: 'Sign in', exact: true }).click();
  await page.waitForURL(/\/team\//);
}

/** A person at a window of their own, already signed in. */
export async function person(
  browser: Browser,
  url: string,
  email: string,
  options: Parameters<Browser['newContext']>[0] = {},
): Promise<{ page: Page; context: BrowserContext }> {
  const context = await browser.newContext({ viewport: { width: 1440, height: 900 }, ...options });
  const page = await context.newPage();
  await signIn(page, url, email);
  return { page, context };
}
