import { useMemo, useState } from 'react';
import type { Series } from '#shared/evidence/evidence.ts';
import { Button } from '#src/components/button.tsx';
import { Notice } from '#src/components/notice.tsx';
import { TextArea } from '#src/components/text-area.tsx';
import { useEvidence } from '#src/lib/evidence/use-evidence.ts';
import { countOf } from '#src/lib/say/count-of.ts';
import { say } from '#src/lib/sill-store.ts';
import { entryFields } from '../view/next-trial.ts';
import { readPastedBlock, type PastedBlock } from '../view/pasted-block.ts';
import { PastePreview } from './paste-preview.tsx';
import { useLogTrials } from './use-log-trials.ts';

/** Takes a block of rows from a spreadsheet; shows what is understood before anything is logged. */
export function PastePanel({ series, onClose }: { readonly series: Series; readonly onClose: () => void }) {
  const evidence = useEvidence();
  const fields = useMemo(() => entryFields(series, evidence), [series, evidence]);
  const [text, setText] = useState('');
  const [chosen, setChosen] = useState<Record<number, string | null>>({});
  const [refusal, setRefusal] = useState<string | null>(null);
  const block = useMemo(() => readPastedBlock(text, fields, chosen), [text, fields, chosen]);
  const { log, withdraw, isSending } = useLogTrials();
  const obstacle = text.trim() === '' ? null : obstacleOf(block, fields);

  async function logAll(): Promise<void> {
    setRefusal(null);
    const at = new Date().toISOString();
    const outcome = await log(
      series.id,
      block.rows.map(({ values }) => ({ id: crypto.randomUUID(), values, at })),
    );
    if (outcome.status === 'refused') {
      setRefusal(outcome.sentence);
      return;
    }
    if (outcome.status === 'logged') {
      say(`${countOf(outcome.trials.length, 'trial')} logged in series ${series.letter}.`, {
        words: 'Undo',
        run: () => withdraw(outcome.trials),
      });
    }
    onClose();
  }

  return (
    <section
      aria-label={`Paste rows into series ${series.letter}`}
      className="border-b border-rule bg-paper px-7 py-5 max-sm:px-4"
    >
      <h2 className="h3">Paste rows into series {series.letter}</h2>
      <TextArea
        label="Rows copied from a spreadsheet"
        hint={`One trial a row, in this order unless the first row names the columns: ${fields.map(({ quantity }) => quantity.symbol).join(', ')}. A cell may be 46.1, 46.1 ± 0.4, 46.1(4) or 461 mm.`}
        rows={5}
        className="font-code"
        spellCheck={false}
        value={text}
        onChange={(event) => setText(event.target.value)}
      />
      {block.rows.length > 0 && text.trim() !== '' && (
        <PastePreview
          block={block}
          fields={fields}
          onChoose={(index, quantity) => setChosen((before) => ({ ...before, [index]: quantity }))}
        />
      )}
      {obstacle && <p className="mt-3 text-sm text-leak">{obstacle}</p>}
      {refusal && (
        <Notice title="Nothing was logged." className="mt-3">
          {refusal}
        </Notice>
      )}
      <div className="mt-4 flex gap-2.5">
        <Button
          kind="main"
          busy={isSending}
          disabled={text.trim() === '' || obstacle !== null}
          onClick={() => void logAll()}
        >
          {block.rows.length > 0 ? `Log ${countOf(block.rows.length, 'trial')}` : 'Log the rows'}
        </Button>
        <Button kind="plain" onClick={onClose}>
          Leave it
        </Button>
      </div>
    </section>
  );
}

/** Why the rows cannot be logged as they stand; all or none are. */
function obstacleOf(
  block: PastedBlock,
  fields: readonly { quantity: { id: string; name: string } }[],
): string | null {
  if (block.sentence) return block.sentence;
  const taken = new Set(block.columns.map(({ quantity }) => quantity?.id));
  const absent = fields
    .filter(({ quantity }) => !taken.has(quantity.id))
    .map(({ quantity }) => quantity.name);
  if (absent.length > 0) return `No column is taken for the ${absent.join(', ')}. Choose one above.`;
  const wrong = block.rows.filter(({ faults }) => Object.keys(faults).length > 0);
  if (wrong.length === 0) return null;
  return `${countOf(wrong.length, 'row')} cannot be read; the cells are marked. Mend them in the text above.`;
}
