import type { TrialsTableView } from '#shared/report/trials-table.ts';
import { QuantitySymbol } from '#src/components/quantity-symbol.tsx';

/** Trials of a series in groups of equal settings, with the mean of each group. */
export function SeriesTable({ view }: { readonly view: TrialsTableView }) {
  const readings = view.columns.filter(({ kind }) => kind === 'reading');
  return (
    <table className="w-full border-collapse font-ui text-sm">
      <thead>
        <tr className="border-b-[1.25px] border-ink text-left text-xs text-ink-2">
          <th scope="col" className="py-1.5 pr-3 font-[550]">
            Trial
          </th>
          {view.columns.map(({ quantity, symbol, unit }) => (
            <th key={quantity} scope="col" className="px-3 py-1.5 text-right font-[550]">
              <QuantitySymbol symbol={symbol} />
              {unit && ` / ${unit}`}
            </th>
          ))}
          {readings.map(({ quantity, symbol, unit }) => (
            <th key={`mean ${quantity}`} scope="col" className="py-1.5 pl-3 text-right font-[550]">
              mean <QuantitySymbol symbol={symbol} />
              {unit && ` / ${unit}`}
            </th>
          ))}
        </tr>
      </thead>
      <tbody>
        {view.groups.map((group) =>
          group.rows.map((row, index) => (
            <tr key={row.trial} className={index === group.rows.length - 1 ? 'border-b border-hair' : ''}>
              <td
                className={`py-[3px] pr-3 ${row.excluded === null ? '' : 'text-ink-3 line-through'}`}
                title={row.excluded ?? undefined}
              >
                {row.name}
              </td>
              {row.cells.map((cell, column) => (
                <td
                  key={view.columns[column]?.quantity}
                  className={`px-3 py-[3px] text-right whitespace-nowrap ${row.excluded !== null ? 'text-ink-3 line-through' : view.columns[column]?.kind === 'reading' ? 'text-measured' : ''}`}
                >
                  {cell}
                </td>
              ))}
              {readings.map(({ quantity }, column) => (
                <td
                  key={`mean ${quantity}`}
                  className="py-[3px] pl-3 text-right font-semibold whitespace-nowrap text-measured"
                >
                  {index === 0 ? group.means[column] : null}
                </td>
              ))}
            </tr>
          )),
        )}
      </tbody>
    </table>
  );
}
