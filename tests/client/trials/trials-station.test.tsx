/** The trials of the invented Leaning Spout as a member sees and logs them. */
import { cleanup, screen, within } from '@testing-library/react';
import { afterEach, beforeAll, beforeEach, describe, expect, test, vi } from 'vitest';
import { json, refusal, type FakeServer } from '../support/fake-server.ts';
import { TODAY } from '../support/invented.ts';
import { API, ENOUGH, PROBLEM, spoutEvidence, spoutServer } from '../support/leaning-spout.ts';
import { renderAt, valueOf } from '../support/render-at.tsx';

const plain = (text: string | null | undefined) => (text ?? '').replaceAll('\u00a0', ' ');
let server: FakeServer;

beforeAll(async () => {
  await import('#src/app/frames/problem-frame.tsx');
  await import('#src/app/screens/trials-screen.tsx');
}, 90_000);
beforeEach(() => {
  vi.useFakeTimers({ now: TODAY, toFake: ['Date'] });
  server = spoutServer();
});
afterEach(() => {
  cleanup();
  vi.unstubAllGlobals();
  vi.useRealTimers();
  localStorage.clear();
});

async function open() {
  const view = renderAt(`${PROBLEM}/trials/B`);
  const bar = await screen.findByRole('form', { name: 'The next trial' }, ENOUGH);
  return { ...view, bar, within: within(bar) };
}

const rowOf = (name: string) => {
  const row = screen.getByText(name, { selector: 'td *' }).closest('tr');
  if (!row) throw new Error(`no row of ${name}`);
  return row;
};

describe('the entry bar', () => {
  test('before logging: says what was predicted and how far the reading is from it', async () => {
    const { user, bar, within: inBar } = await open();
    await user.clear(inBar.getByLabelText('lean of the can, θ'));
    await user.type(inBar.getByLabelText('lean of the can, θ'), '45');
    await user.type(inBar.getByLabelText('range on the tray, R'), '44.7');

    expect(plain(bar.textContent)).toMatch(/Predicted 47\.0 ± 0\.\d cm, so this reads 2\.3 cm short\./);
  });

  test('when a trial is logged: says what the reading did, and the reading is empty and has the caret', async () => {
    const { user, bar, within: inBar } = await open();
    await user.clear(inBar.getByLabelText('lean of the can, θ'));
    await user.type(inBar.getByLabelText('lean of the can, θ'), '45');
    await user.type(inBar.getByLabelText('range on the tray, R'), '44.7{Enter}');

    expect(plain((await inBar.findByText(/B20 logged\./)).textContent)).toMatch(/B20 logged\..*cm/);
    const reading = inBar.getByLabelText('range on the tray, R');
    expect(valueOf(reading)).toBe('');
    expect(document.activeElement).toBe(reading);
    expect(valueOf(inBar.getByLabelText('lean of the can, θ'))).toBe('45');
    expect(plain(bar.textContent)).toContain('Undo');
    expect(server.asked(`POST ${API}/series/series-b/trials`)).toHaveLength(1);
  });

  test('when nothing is written: says so at the field and sends nothing', async () => {
    const { user, within: inBar } = await open();

    await user.click(inBar.getByRole('button', { name: 'Log trial' }));

    expect(inBar.getByRole('alert').textContent).toContain('Nothing is written here yet.');
    expect(server.asked(`POST ${API}/series/series-b/trials`)).toHaveLength(0);
  });

  test('when the server refuses the reading: its sentence stands at that field, and what was typed stays', async () => {
    server.on(`POST ${API}/series/series-b/trials`, () =>
      refusal(422, 'reading-refused', 'One reading is refused.', {
        'trials.0.values.q-r': 'The tray ends at 60 cm.',
      }),
    );
    const { user, within: inBar } = await open();
    await user.type(inBar.getByLabelText('range on the tray, R'), '99{Enter}');

    expect(await inBar.findByText('The tray ends at 60 cm.')).toBeTruthy();
    expect(valueOf(inBar.getByLabelText('range on the tray, R'))).toBe('99');
  });

  test('when the server is out of reach: the trial waits here and the bar says so', async () => {
    const { user, within: inBar } = await open();
    server.setReachable(false);
    await user.type(inBar.getByLabelText('range on the tray, R'), '39.7{Enter}');

    expect(await inBar.findByText(/1 trial not sent yet/)).toBeTruthy();
  });
});

describe('a trial in the table', () => {
  test('that is excluded: stays with its reason, struck, and can be brought back', async () => {
    server.on(`PATCH ${API}/trials/trial-b11`, ({ body }) =>
      json({
        version: spoutEvidence().version + 1,
        mutationId: (body as { mutationId: string }).mutationId,
        changes: [],
      }),
    );
    const { user } = await open();
    const row = rowOf('B11');

    expect(row.textContent).toContain('Can slid back 3 cm');
    await user.click(within(row).getByRole('button', { name: 'Bring back' }));

    expect(server.asked(`PATCH ${API}/trials/trial-b11`)[0]?.body).toMatchObject({
      change: { kind: 'bring back' },
    });
  });

  test('that shall be excluded: the dialog tells the mean without it, and asks for a reason', async () => {
    server.on(`PATCH ${API}/trials/trial-b19`, ({ body }) =>
      json({
        version: spoutEvidence().version + 1,
        mutationId: (body as { mutationId: string }).mutationId,
        changes: [],
      }),
    );
    const { user } = await open();
    await user.click(screen.getByRole('button', { name: 'B19, what to do with it' }));
    await user.click(await screen.findByRole('menuitem', { name: 'Exclude, with a reason' }));
    const dialog = await screen.findByRole('dialog', { name: 'Leave B19 out?' });

    expect(plain(dialog.textContent)).toMatch(
      /It reads 39\.7 cm\. The mean here goes from 39\.\d+ cm of 3 to 39\.\d+ cm of 2\./,
    );
    await user.click(within(dialog).getByRole('button', { name: 'Exclude B19' }));
    expect(within(dialog).getByText('Say why it is left out.')).toBeTruthy();
    expect(server.asked(`PATCH ${API}/trials/trial-b19`)).toHaveLength(0);

    await user.type(within(dialog).getByLabelText('Why it is left out'), 'The tray was moved');
    await user.click(within(dialog).getByRole('button', { name: 'Exclude B19' }));
    expect(server.asked(`PATCH ${API}/trials/trial-b19`)[0]?.body).toMatchObject({
      change: { kind: 'exclude', reason: 'The tray was moved' },
    });
  });

  test('that another series lends: offers nothing to do with it here', async () => {
    await open();

    expect(screen.queryByRole('button', { name: 'A1, what to do with it' })).toBeNull();
    expect(rowOf('A1').textContent).toContain('30.0');
  });

  test('seen by an advisor: is read only, and no trial can be logged', async () => {
    cleanup();
    server = spoutServer(spoutEvidence(), 'advisor');
    renderAt(`${PROBLEM}/trials/B`);
    await screen.findByText('B19', undefined, ENOUGH);

    expect(screen.queryByRole('button', { name: 'Log trial' })).toBeNull();
    expect(screen.queryByRole('button', { name: 'Bring back' })).toBeNull();
  });
});

describe('pasted rows', () => {
  test('are shown as understood, a cell that cannot be read holds all of them back', async () => {
    const { user } = await open();
    await user.click(screen.getByRole('button', { name: 'Paste rows' }));
    const panel = within(screen.getByRole('region', { name: 'Paste rows into series B' }));
    await user.click(panel.getByLabelText('Rows copied from a spreadsheet'));
    await user.paste('R (mm)\tθ\n361\t10\nabout 36\t10');

    const preview = within(panel.getByRole('region', { name: 'What is understood' }));
    expect(valueOf(preview.getByRole('combobox', { name: 'R (mm) is' }))).toBe('q-r');
    expect(plain(preview.getByText(/361/).textContent)).toContain('361');
    expect(panel.getByText(/1 row cannot be read/)).toBeTruthy();
    expect(panel.getByRole('button', { name: /Log 2 trials/ }).hasAttribute('disabled')).toBe(true);
  });

  test('all understood: are logged together, and the panel closes', async () => {
    const { user } = await open();
    await user.click(screen.getByRole('button', { name: 'Paste rows' }));
    const panel = within(screen.getByRole('region', { name: 'Paste rows into series B' }));
    await user.click(panel.getByLabelText('Rows copied from a spreadsheet'));
    await user.paste('θ\tR\n10\t36.1\n10\t36.5');
    await user.click(panel.getByRole('button', { name: 'Log 2 trials' }));

    expect((await screen.findAllByText(/2 trials logged in series B\./)).length).toBeGreaterThan(0);
    expect(screen.queryByRole('region', { name: 'Paste rows into series B' })).toBeNull();
    expect(server.asked(`POST ${API}/series/series-b/trials`)[0]?.body).toMatchObject({
      trials: [{ values: { 'q-r': { text: '36.1' } } }, { values: { 'q-r': { text: '36.5' } } }],
    });
  });
});

describe('the register', () => {
  test('each quantity: says how it is known and what it is, in a row that opens its form', async () => {
    await open();
    const register = within(screen.getByRole('complementary', { name: 'Quantities and instruments' }));
    const textOf = (name: string) => plain(register.getByRole('button', { name }).closest('li')?.textContent);

    expect(textOf('Change range on the tray, R')).toMatch(/ruled tray, every trial± 0\.4 cm$/);
    expect(textOf('Change spout above the tray, y')).toContain('12.00 ± 0.10 cm');
    expect(textOf('Change surface tension, σ')).toMatch(/not measured$/);
    expect(textOf('Change effective head, H')).toContain('in series B');
  });

  test('a slope: the form asks what it is taken against, and sends it', async () => {
    server.on(`POST ${API}/quantities`, ({ body }) =>
      json(
        {
          version: spoutEvidence().version + 1,
          mutationId: (body as { mutationId: string }).mutationId,
          changes: [],
          id: 'q-new',
          rowVersion: 1,
        },
        201,
      ),
    );
    const { user } = await open();
    await user.click(screen.getByRole('button', { name: 'New quantity' }));
    const form = within(screen.getByRole('form', { name: 'New quantity' }));
    await user.type(form.getByLabelText('Symbol'), 'm');
    await user.type(form.getByLabelText('Name'), 'slope of range against head');
    await user.selectOptions(form.getByLabelText('Its value is'), 'summary');
    await user.selectOptions(form.getByLabelText('Statistic'), 'slope');
    await user.selectOptions(form.getByLabelText('Of'), 'q-r');
    await user.selectOptions(form.getByLabelText('Over the series'), 'series-a');
    await user.click(form.getByRole('button', { name: 'Add quantity' }));

    expect(await form.findByText('Choose what the slope is taken against.')).toBeTruthy();
    await user.selectOptions(form.getByLabelText('Against'), 'q-h');
    await user.click(form.getByRole('button', { name: 'Add quantity' }));

    await vi.waitFor(() => expect(server.asked(`POST ${API}/quantities`)).toHaveLength(1));
    expect(server.asked(`POST ${API}/quantities`)[0]?.body).toMatchObject({
      row: { symbol: 'm', def: { origin: 'summary', stat: 'slope', of: 'q-r', against: 'q-h' } },
    });
  });
});
