/** How a number shows what it is, and where it comes from. */
import { cleanup, render, screen, within } from '@testing-library/react';
import { userEvent } from '@testing-library/user-event';
import { afterEach, beforeAll, describe, expect, test, vi } from 'vitest';
import type { ValueReference } from '#shared/evidence/evidence.ts';
import { LiveValueText } from '#src/components/live-value-text.tsx';
import { ProvenanceCard } from '#src/components/provenance/provenance-card.tsx';
import type { FindingsStore } from '#src/lib/findings/findings-store.ts';
import { spoutEvidence } from '../support/leaning-spout.ts';
import { evaluated, renderInProblem } from '../support/render-in-problem.tsx';

const plain = (text: string | null | undefined) => (text ?? '').replaceAll('\u00a0', ' ');
const MEAN: ValueReference = {
  kind: 'mean',
  quantity: 'q-r',
  series: 'series-b',
  at: { 'q-theta': { text: '38', unit: '°' } },
};

afterEach(cleanup);

describe('a number in the text', () => {
  test.each([
    ['measured', 'fresh', 'lv-measured'],
    ['predicted', 'fresh', 'lv-predicted'],
    ['difference', 'fresh', 'lv-difference'],
    ['count', 'fresh', 'lv-count'],
    ['measured', 'untied', 'lv-untied'],
    ['measured', 'gone', 'lv-gone'],
  ] as const)('%s and %s: has its own form', (hue, state, form) => {
    render(<LiveValueText hue={hue} state={state} text="46.4 cm" spoken="46.4 centimetres" />);

    expect(screen.getByRole('button', { name: '46.4 centimetres' }).classList.contains(form)).toBe(true);
  });

  test('that has moved: the old value is struck before it', () => {
    const { container } = render(
      <LiveValueText
        hue="measured"
        state="moved"
        before="46.2 cm"
        text="46.4 cm"
        spoken="46.4 centimetres"
      />,
    );

    expect(container.querySelector('del')?.textContent).toBe('46.2 cm');
    expect(container.textContent).toBe('46.2 cm46.4 cm');
  });

  test('when it is pressed, or Enter on it: asks for its provenance', async () => {
    const onOpen = vi.fn();
    render(<LiveValueText hue="measured" text="46.4 cm" spoken="46.4 centimetres" onOpen={onOpen} />);
    const user = userEvent.setup();

    await user.click(screen.getByRole('button'));
    await user.keyboard('{Enter}');

    expect(onOpen).toHaveBeenCalledTimes(2);
  });
});

describe('the provenance card', () => {
  let store: FindingsStore;
  beforeAll(async () => {
    store = await evaluated(spoutEvidence());
    await import('#src/components/provenance/drawn-provenance-card.tsx');
  });

  const open = async (reference: ValueReference, onClose = vi.fn()) => {
    const view = renderInProblem(
      <ProvenanceCard reference={reference} unit={null} onClose={onClose} place={{}} takesFocus />,
      store,
    );
    const card = await screen.findByRole('dialog', { name: /comes from/ });
    return { ...view, card, onClose };
  };

  test('of a mean: its trials and the parts of its uncertainty are nested lists', async () => {
    const { card } = await open(MEAN);
    const lists = within(card).getAllByRole('list');
    const inner = lists.filter((list) => list.parentElement?.closest('ul, ol, [role=list]'));

    expect(plain(card.textContent)).toContain('46.4 ± 0.3 cm');
    expect(inner.map((list) => plain(list.textContent)).join(' ')).toMatch(
      /46\.1.*B10.*46\.3.*B12.*46\.9.*B13/,
    );
    expect(plain(card.textContent)).toMatch(/Left out: B11/);
  });

  test('opened by a key: has the focus; Escape closes it', async () => {
    const { card, user, onClose } = await open(MEAN);
    expect(card.contains(document.activeElement)).toBe(true);

    await user.keyboard('{Escape}');

    expect(onClose).toHaveBeenCalledOnce();
  });

  test('of a quantity that is gone: says so in a sentence, and nothing is invented', async () => {
    const { card } = await open({ kind: 'quantity', quantity: 'q-gone' });

    expect(plain(card.textContent)).toMatch(/gone|source/);
    expect(plain(card.textContent)).not.toMatch(/NaN|undefined/);
  });
});
