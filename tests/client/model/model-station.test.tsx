/** The model of the invented Leaning Spout: formulas, budget, comparison and claims, as they are read. */
import { cleanup, screen, within } from '@testing-library/react';
import { afterEach, beforeAll, beforeEach, describe, expect, test, vi } from 'vitest';
import type { Evidence } from '#shared/evidence/evidence.ts';
import { TODAY } from '../support/invented.ts';
import { ENOUGH, PROBLEM, spoutEvidence, spoutServer } from '../support/leaning-spout.ts';
import { renderAt } from '../support/render-at.tsx';

const plain = (text: string | null | undefined) => (text ?? '').replaceAll('\u00a0', ' ');

beforeAll(async () => {
  await import('#src/app/frames/problem-frame.tsx');
  await import('#src/app/screens/model-screen.tsx');
}, 90_000);
beforeEach(() => {
  vi.useFakeTimers({ now: TODAY, toFake: ['Date'] });
});
afterEach(() => {
  cleanup();
  vi.unstubAllGlobals();
  vi.useRealTimers();
  localStorage.clear();
});

async function open(evidence: Evidence = spoutEvidence()) {
  spoutServer(evidence);
  const view = renderAt(`${PROBLEM}/model/3`);
  const sheet = await screen.findByRole('region', { name: 'Model 3' }, ENOUGH);
  return { ...view, sheet: within(sheet) };
}

describe('the formulas of a model', () => {
  test('whose units agree: one sentence says so, once', async () => {
    const { sheet } = await open();

    expect(sheet.getAllByText('Units agree, cm on both sides.')).toHaveLength(1);
    expect(sheet.getByRole('group', { name: 'range on the tray, formula' })).toBeTruthy();
  });

  test('one of which has units that do not agree: says which formula, both units, and what may be missing', async () => {
    const evidence = spoutEvidence();
    const models = evidence.models.map((model) =>
      model.n === 3
        ? {
            ...model,
            equations: model.equations.map((row) =>
              row.defines === 'q-head' ? { ...row, expr: '{q-cv}^2*{q-h}^2' } : row,
            ),
          }
        : model,
    );
    const { sheet } = await open({ ...evidence, models });

    const alert =
      sheet.getByText('Formula 1.').closest('[role=alert]') ?? sheet.getByText('Formula 1.').parentElement;
    expect(plain(alert?.textContent)).toMatch(/Units do not agree.*cm.*cm²/);
    expect(sheet.queryByText('Units agree, cm on both sides.')).toBeNull();
  });
});

describe('the uncertainty budget', () => {
  test('names every source with its share, largest first, and the shares make the whole', async () => {
    const { sheet } = await open();
    const table = sheet.getByRole('table');
    const rows = within(table)
      .getAllByRole('row')
      .slice(1)
      .map((row) => plain(row.textContent));
    const shares = rows.map((text) => Number(/(\d+) %$/.exec(text)?.[1]));

    expect(rows[0]).toMatch(/0\.967 ± 0\.008fit of “Upright can”/);
    expect(rows.at(-1)).toMatch(/47\.9 ± 0\.7 cmpredicted100 %$/);
    expect(shares.slice(0, -1)).toEqual(shares.slice(0, -1).sort((a, b) => b - a));
    expect(shares.slice(0, -1).reduce((sum, share) => sum + share, 0)).toBeGreaterThanOrEqual(98);
  });

  test('of a setting that is held through a series: says what it was held at', async () => {
    const { sheet } = await open();
    const held = within(sheet.getByRole('table'))
      .getAllByRole('row')
      .map((row) => plain(row.textContent))
      .find((text) => text.includes('held in series B'));

    expect(held).toContain('20.0 cm');
  });
});

describe('the comparison', () => {
  test('is told in one sentence, with the predicted and the measured value', async () => {
    await open();
    const panel = within(screen.getByRole('region', { name: 'Comparison' }));
    const sentence = panel.getByText(/agree within/).closest('p');

    expect(plain(sentence?.textContent)).toMatch(
      /^Four of seven values of θ agree within 2 u\. The model misses most at θ = 55°, by 3\.5 u: predicted 42\.2 ± 0\.7 cm, measured 39\.7 ± 0\.3 cm\.$/,
    );
  });

  test('against another model: is chosen by its words, and that model is opened', async () => {
    const { user, router } = await open();
    const panel = within(screen.getByRole('region', { name: 'Comparison' }));

    await user.click(panel.getByRole('button', { name: 'model 3. Choose another' }));
    await user.click(await screen.findByRole('menuitem', { name: /^model 2/ }));

    await vi.waitFor(() => expect(router.state.location.pathname).toBe(`${PROBLEM}/model/2`));
  });
});

test('the claims below it: each has its sentence, its measure and its verdict', async () => {
  await open();
  const rows = within(screen.getByRole('region', { name: 'Claims' }))
    .getAllByRole('listitem')
    .map((row) => plain(row.textContent));

  expect(rows).toHaveLength(4);
  expect(rows[2]).toMatch(
    /At a head of 20 cm the largest range is 47\.9 cm\.measured 1\.5 cm less, 2\.3 u.*Leaks/,
  );
  expect(rows[3]).toMatch(/Undecided$/);
});
