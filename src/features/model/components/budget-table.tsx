import { useMemo } from 'react';
import type { Model, Quantity } from '#shared/evidence/evidence.ts';
import { findValue } from '#shared/evidence/find-value.ts';
import type { ComparisonPoint, Scalar } from '#shared/evidence/findings.ts';
import { formatScalar } from '#shared/formatting/format-scalar.ts';
import { readingText } from '#shared/report/reading-text.ts';
import { QuantitySymbol } from '#src/components/quantity-symbol.tsx';
import { SentenceText } from '#src/components/sentence-text.tsx';
import { useFindingsSnapshot } from '#src/lib/evidence/use-evidence.ts';
import { budgetRows, type BudgetRow } from '../view/budget-view.ts';

interface BudgetTableProps {
  readonly output: Quantity;
  readonly model: Model;
  readonly point: ComparisonPoint;
  /** "38°" */
  readonly where: string;
  readonly predicted: Scalar;
}

/** The uncertainty budget of what the model predicts at one setting. */
export function BudgetTable({ output, point, where, predicted }: BudgetTableProps) {
  const { evidence, findings } = useFindingsSnapshot();
  const rows = useMemo(() => budgetRows(predicted, evidence, findings), [predicted, evidence, findings]);
  const most = rows[0]?.share ?? 1;
  return (
    <section className="mt-6">
      <h2 className="font-report text-[19px]/6.5 font-medium">
        Uncertainty budget of <QuantitySymbol symbol={output.symbol} />
        {where && ` at ${where}`}
      </h2>
      <table className="mt-1 w-full border-collapse text-sm">
        <thead>
          <tr className="border-b-[1.25px] border-ink text-left text-xs text-ink-2">
            <th scope="col" colSpan={2} className="py-1 font-normal">
              Quantity
            </th>
            <th scope="col" className="py-1 font-normal">
              Known by
            </th>
            <th scope="col" className="w-30 py-1 pl-4 font-normal max-[380px]:w-auto max-[380px]:pl-2">
              Share of <i className="font-report">u</i>
              <sup>2</sup>
            </th>
          </tr>
        </thead>
        <tbody>
          {rows.map((row) => (
            <Row key={row.key} row={row} point={point} most={most} />
          ))}
          <tr className="border-t-[1.25px] border-ink">
            <td className="py-2 text-[19px]">
              <QuantitySymbol symbol={output.symbol} />
            </td>
            <td className="py-2 font-semibold whitespace-nowrap text-predicted">
              {formatScalar(predicted, output.unit, evidence.settings.rounding)}
            </td>
            <td className="py-2">predicted</td>
            <td className="py-2 pl-4 max-[380px]:pl-2">
              <Share share={1} width={66} />
            </td>
          </tr>
        </tbody>
      </table>
    </section>
  );
}

function Row({
  row,
  point,
  most,
}: {
  readonly row: BudgetRow;
  readonly point: ComparisonPoint;
  readonly most: number;
}) {
  const { evidence, findings } = useFindingsSnapshot();
  const value = row.held
    ? { text: readingText(row.held), isPredicted: false }
    : row.quantity
      ? valueAt(row.quantity)
      : null;
  function valueAt(quantity: Quantity): { text: string; isPredicted: boolean } | null {
    const { rounding } = evidence.settings;
    const series = evidence.trials.find(({ id }) => id === point.trials[0])?.series;
    const found =
      series && point.settings[quantity.id]
        ? findValue(findings, evidence, { kind: 'mean', quantity: quantity.id, series, at: point.settings })
        : findValue(findings, evidence, { kind: 'quantity', quantity: quantity.id, series });
    const setting = point.settings[quantity.id];
    if (found.shape === 'fault') {
      return setting ? { text: readingText(setting), isPredicted: false } : null;
    }
    return { text: formatScalar(found, quantity.unit, rounding), isPredicted: found.hue === 'predicted' };
  }
  return (
    <tr className="border-b border-hair [&:nth-last-child(2)]:border-b-0">
      <td className="w-8 py-2 pr-1.5 text-[19px]">
        {row.quantity && <QuantitySymbol symbol={row.quantity.symbol} />}
      </td>
      <td
        className={`py-2 pr-3 font-semibold whitespace-nowrap ${value?.isPredicted ? 'text-predicted' : 'text-measured'}`}
      >
        {value?.text}
      </td>
      <td className="py-2 text-ink-2">
        <SentenceText text={row.words} symbols={evidence.quantities.map(({ symbol }) => symbol)} />
      </td>
      <td className="py-2 pl-4 max-[380px]:pl-2">
        <Share share={row.share} width={(66 * row.share) / most} />
      </td>
    </tr>
  );
}

function Share({ share, width }: { readonly share: number; readonly width: number }) {
  return (
    <span className="flex items-center gap-2">
      <span
        className="block h-2 flex-none bg-ink-3 max-[380px]:hidden"
        style={{ width: Math.max(1.5, width) }}
      />
      <span className="text-xs whitespace-nowrap text-ink-2">{`${Math.round(share * 100)} %`}</span>
    </span>
  );
}
