import { cleanup, render, screen } from '@testing-library/react';
import { userEvent } from '@testing-library/user-event';
import { createMemoryRouter, RouterProvider } from 'react-router-dom';
import { afterEach, expect, test } from 'vitest';
import { useDigitKeys } from '#src/app/keys/use-digit-keys.ts';
import { useRegionRing } from '#src/app/keys/use-region-ring.ts';
import { KeysSlip } from '#src/app/top-line/keys-slip.tsx';
import { digitKeys } from '#src/lib/preferences/digit-keys.ts';

afterEach(() => {
  cleanup();
  localStorage.clear();
  digitKeys.set('on');
});

function Page() {
  useDigitKeys(['/trials', '/model', '/report'], '/season');
  useRegionRing();
  return (
    <>
      <KeysSlip />
      <main data-region="page" tabIndex={-1} aria-label="page">
        <input aria-label="reading" />
        <form data-region="entry bar" tabIndex={-1}>
          <button type="button" data-region-start>
            Lean
          </button>
        </form>
      </main>
      <div data-region="sill" tabIndex={-1}>
        <button data-region-start>Formula</button>
      </div>
    </>
  );
}

function open() {
  const router = createMemoryRouter([{ path: '*', element: <Page /> }], { initialEntries: ['/start'] });
  render(<RouterProvider router={router} />);
  return { user: userEvent.setup(), at: () => router.state.location.pathname };
}

test.each([
  ['1', '/trials'],
  ['3', '/report'],
  ['0', '/season'],
  ['4', '/start'],
])('digit %s, when no field has the focus: leads to %s', async (key, place) => {
  const { user, at } = open();

  await user.keyboard(key);

  expect(at()).toBe(place);
});

test('digits, inside a field: are text', async () => {
  const { user, at } = open();

  await user.type(screen.getByLabelText('reading'), '12');

  expect(at()).toBe('/start');
});

test('digits, with Control held: are left to the browser', async () => {
  const { user, at } = open();

  await user.keyboard('{Control>}1{/Control}');

  expect(at()).toBe('/start');
});

test('digits, when they are switched off in the slip: lead nowhere, and the slip says so', async () => {
  const { user, at } = open();

  await user.click(screen.getByRole('button', { name: 'Keys' }));
  await user.click(await screen.findByRole('button', { name: 'Switch off' }));
  expect(screen.getByRole('dialog').textContent).toContain('They are off.');
  await user.keyboard('{Escape}1');

  expect(at()).toBe('/start');
});

test('keys slip, when Escape is pressed: closes and gives the focus back', async () => {
  const { user } = open();

  await user.click(screen.getByRole('button', { name: 'Keys' }));
  await screen.findByRole('dialog', { name: 'Keys' });
  await user.keyboard('{Escape}');

  expect(screen.queryByRole('dialog')).toBeNull();
  expect(document.activeElement).toBe(screen.getByRole('button', { name: 'Keys' }));
});

test('F6: goes to the page, to the bar inside it, to where the sill begins, and with Shift back', async () => {
  const { user } = open();

  await user.keyboard('{F6}');
  expect(document.activeElement).toBe(screen.getByRole('main'));
  await user.keyboard('{F6}');
  expect(document.activeElement).toBe(screen.getByRole('button', { name: 'Lean' }));
  await user.keyboard('{F6}');
  expect(document.activeElement).toBe(screen.getByRole('button', { name: 'Formula' }));
  await user.keyboard('{Shift>}{F6}{/Shift}{Shift>}{F6}{/Shift}');

  expect(document.activeElement).toBe(screen.getByRole('main'));
});
