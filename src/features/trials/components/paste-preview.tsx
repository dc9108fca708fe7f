import { QuantitySymbol } from '#src/components/quantity-symbol.tsx';
import { showTyped } from '../view/show-typed.ts';
import type { EntryField } from '../view/next-trial.ts';
import type { PastedBlock } from '../view/pasted-block.ts';

/** What is understood of a pasted block: each column with the quantity it is taken for, each cell as it will be logged. */
export function PastePreview({
  block,
  fields,
  onChoose,
}: {
  readonly block: PastedBlock;
  readonly fields: readonly EntryField[];
  readonly onChoose: (index: number, quantity: string | null) => void;
}) {
  return (
    <div
      className="mt-3 max-h-64 overflow-auto border-y border-rule"
      role="region"
      aria-label="What is understood"
      tabIndex={0}
    >
      <table className="w-full border-collapse text-sm">
        <thead className="sticky top-0 bg-paper">
          <tr className="border-b-[1.25px] border-ink text-left text-xs text-ink-2">
            <th scope="col" className="px-2.5 py-1.5 font-[550]">
              Line
            </th>
            {block.columns.map(({ head, quantity }, index) => (
              <th key={index} scope="col" className="px-2.5 py-1.5 font-[550]">
                <label className="flex items-center gap-2">
                  <span className="text-ink-3">{head ?? `Column ${index + 1}`}</span>
                  <select
                    className="h-7 rounded-md border-[1.25px] border-edge bg-paper px-1"
                    aria-label={`${head ?? `Column ${index + 1}`} is`}
                    value={quantity?.id ?? ''}
                    onChange={(event) => onChoose(index, event.target.value || null)}
                  >
                    <option value="">left out</option>
                    {fields.map((field) => (
                      <option key={field.quantity.id} value={field.quantity.id}>
                        {field.quantity.symbol}, {field.quantity.name}
                      </option>
                    ))}
                  </select>
                  {quantity && <QuantitySymbol symbol={quantity.symbol} />}
                </label>
              </th>
            ))}
          </tr>
        </thead>
        <tbody>
          {block.rows.map((row) => (
            <tr key={row.line} className="border-b border-hair">
              <td className="px-2.5 py-1 text-ink-3">{row.line}</td>
              {block.columns.map(({ quantity }, index) => {
                const fault = row.faults[index];
                const reading = quantity ? row.values[quantity.id] : undefined;
                return (
                  <td
                    key={index}
                    className={`px-2.5 py-1 ${fault ? 'bg-leak-wash text-leak' : reading ? 'text-measured' : 'text-ink-3 line-through'}`}
                  >
                    {reading ? showTyped(reading) : (row.cells[index] ?? '')}
                    {fault && <span className="block text-xs">{fault}</span>}
                  </td>
                );
              })}
            </tr>
          ))}
        </tbody>
      </table>
    </div>
  );
}
