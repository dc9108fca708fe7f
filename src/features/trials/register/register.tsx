import { useState } from 'react';
import { Word } from '#src/components/word.tsx';
import { useEvidence } from '#src/lib/evidence/use-evidence.ts';
import { useProblem } from '#src/lib/problem/problem-context.ts';
import { InstrumentForm } from './instrument-form.tsx';
import { QuantityForm } from './quantity-form.tsx';
import { QuantityRow } from './quantity-row.tsx';

type OpenForm = { readonly kind: 'quantity' | 'instrument'; readonly id: string | null } | null;

/** Everything the problem gives a symbol, and with what it is measured. */
export function Register() {
  const { quantities, instruments } = useEvidence();
  const { mayWrite } = useProblem();
  const [form, setForm] = useState<OpenForm>(null);
  const close = () => setForm(null);
  const isOpen = (kind: 'quantity' | 'instrument', id: string | null) =>
    form?.kind === kind && form.id === id;
  return (
    <aside className="page-sheet px-6 pt-5.5 pb-3 max-sm:px-4" aria-label="Quantities and instruments">
      <h2 className="font-report text-[24px]/[30px] font-medium">Quantities</h2>
      <ul className="mt-3">
        {quantities.map((quantity) =>
          isOpen('quantity', quantity.id) ? (
            <li key={quantity.id}>
              <QuantityForm id={quantity.id} onClose={close} />
            </li>
          ) : (
            <QuantityRow
              key={quantity.id}
              quantity={quantity}
              onChange={mayWrite ? () => setForm({ kind: 'quantity', id: quantity.id }) : null}
            />
          ),
        )}
        {quantities.length === 0 && (
          <li className="border-t-[1.25px] border-ink py-2 font-report text-base text-ink-3 italic">
            h, head above the spout, cm: name what you set and what you read
          </li>
        )}
      </ul>
      {isOpen('quantity', null) && <QuantityForm id={null} onClose={close} />}
      {mayWrite && !isOpen('quantity', null) && (
        <p className="mt-3 mb-1.5 text-sm">
          <Word onClick={() => setForm({ kind: 'quantity', id: null })}>New quantity</Word>
        </p>
      )}
      <h3 className="h3 mt-6">Instruments</h3>
      <ul className="mt-2 text-xs">
        {instruments.map(({ id, name, note }) =>
          isOpen('instrument', id) ? (
            <li key={id}>
              <InstrumentForm id={id} onClose={close} />
            </li>
          ) : (
            <li key={id} className="flex items-baseline justify-between gap-3 border-t border-hair py-2">
              <span className="text-ink-2">
                {name}
                {note && <span className="block text-2xs text-ink-3">{note}</span>}
              </span>
              {mayWrite && (
                <Word aria-label={`Change ${name}`} onClick={() => setForm({ kind: 'instrument', id })}>
                  Change
                </Word>
              )}
            </li>
          ),
        )}
        {instruments.length === 0 && (
          <li className="py-1 font-report text-base text-ink-3 italic">
            steel rule, read to half a millimetre
          </li>
        )}
      </ul>
      {isOpen('instrument', null) && <InstrumentForm id={null} onClose={close} />}
      {mayWrite && !isOpen('instrument', null) && (
        <p className="mt-2 mb-1.5 text-sm">
          <Word onClick={() => setForm({ kind: 'instrument', id: null })}>New instrument</Word>
        </p>
      )}
    </aside>
  );
}
