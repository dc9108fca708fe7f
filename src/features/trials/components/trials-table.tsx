import { createColumnHelper, tableFeatures, useTable } from '@tanstack/react-table';
import { useWindowVirtualizer } from '@tanstack/react-virtual';
import { useLayoutEffect, useMemo, useRef, useState } from 'react';
import { QuantitySymbol } from '#src/components/quantity-symbol.tsx';
import { UnitText } from '#src/components/unit-text.tsx';
import type { Quantity } from '#shared/evidence/evidence.ts';
import { shortName } from '../view/short-name.ts';
import type { SharedScale } from '../view/shared-scale.ts';
import type { GroupLines, SeriesView, TrialLine } from '../view/series-view.ts';
import { StripHead } from './reading-strip.tsx';
import { TrialRow } from './trial-row.tsx';

/** A row of the table: a trial, and the setting it belongs to. */
export interface TableLine {
  readonly line: TrialLine;
  readonly group: GroupLines;
  readonly isFirst: boolean;
  readonly isLast: boolean;
}

const ROW_HEIGHT = 27;
/** Below this many rows all are drawn, so that the browser's own search finds them. */
const VIRTUAL_FROM = 300;

const features = tableFeatures({});
const column = createColumnHelper<typeof features, TableLine>();

interface TrialsTableProps {
  readonly view: SeriesView;
  readonly scale: SharedScale | null;
  readonly onCorrect: (line: TrialLine) => void;
  readonly onEnter: () => void;
}

/** The trials of one series, grouped by setting, each reading drawn in its row. */
export function TrialsTable({ view, scale, onCorrect, onEnter }: TrialsTableProps) {
  const data = useMemo(() => tableLines(view.groups), [view.groups]);
  const columns = useMemo(() => columnsOf(view, scale), [view, scale]);
  const table = useTable({
    features,
    columns,
    data,
    getRowId: ({ line, group }) => `${group.key} ${line.trial.id}`,
  });
  const rows = table.getRowModel().rows;
  const body = useRef<HTMLTableSectionElement>(null);
  const [offset, setOffset] = useState(0);
  useLayoutEffect(() => {
    const top = body.current?.getBoundingClientRect().top ?? 0;
    setOffset(top + window.scrollY);
  }, [rows.length]);
  const isVirtual = rows.length >= VIRTUAL_FROM;
  const virtualizer = useWindowVirtualizer({
    count: isVirtual ? rows.length : 0,
    estimateSize: () => ROW_HEIGHT,
    overscan: 20,
    scrollMargin: offset,
  });
  const seen = virtualizer.getVirtualItems();
  const before = isVirtual ? (seen[0]?.start ?? offset) - offset : 0;
  const after = isVirtual ? virtualizer.getTotalSize() - ((seen.at(-1)?.end ?? offset) - offset) : 0;
  const drawn = isVirtual ? seen.flatMap(({ index }) => rows[index] ?? []) : rows;
  return (
    <div
      className="relative overflow-x-auto"
      role="region"
      aria-label={`Trials of series ${view.series.letter}`}
      tabIndex={0}
      onKeyDown={(event) => {
        const isOnControl = event.target instanceof HTMLElement && event.target.closest('button, a, input');
        if (event.key === 'Enter' && !isOnControl) onEnter();
      }}
    >
      <table className="w-full table-fixed border-collapse text-sm max-sm:w-[760px]">
        <thead>
          {table.getHeaderGroups().map((group) => (
            <tr key={group.id} className="h-11 border-b-[1.25px] border-ink align-bottom text-xs text-ink-2">
              {group.headers.map((header) => (
                <th key={header.id} scope="col" className={headClass(header.id)}>
                  <table.FlexRender header={header} />
                </th>
              ))}
            </tr>
          ))}
        </thead>
        <tbody ref={body}>
          {before > 0 && <Gap height={before} />}
          {drawn.map((row) => (
            <TrialRow key={row.id} row={row.original} view={view} scale={scale} onCorrect={onCorrect} />
          ))}
          {after > 0 && <Gap height={after} />}
        </tbody>
      </table>
    </div>
  );
}

function Gap({ height }: { readonly height: number }) {
  return (
    <tr aria-hidden="true">
      <td style={{ height }} />
    </tr>
  );
}

function tableLines(groups: readonly GroupLines[]): TableLine[] {
  return groups.flatMap((group) =>
    group.lines.map((line, index) => ({
      line,
      group,
      isFirst: index === 0,
      isLast: index === group.lines.length - 1,
    })),
  );
}

function columnsOf({ settings, readings, drawn, model }: SeriesView, scale: SharedScale | null) {
  const others = readings.filter(({ id }) => id !== drawn?.id);
  return column.columns([
    ...settings.map((quantity) =>
      column.display({ id: `setting ${quantity.id}`, header: () => <QuantityHead quantity={quantity} /> }),
    ),
    column.accessor(({ line }) => line.name, { id: 'trial', header: 'Trial' }),
    ...(drawn
      ? [
          column.accessor(({ line }) => line.value, {
            id: 'reading',
            header: () => <QuantityHead quantity={drawn} withUnit />,
          }),
        ]
      : []),
    ...others.map((quantity) =>
      column.display({
        id: `other ${quantity.id}`,
        header: () => <QuantityHead quantity={quantity} withUnit />,
      }),
    ),
    ...(scale
      ? [
          column.display({
            id: 'strip',
            header: () => (
              <>
                <span className="sr-only">Drawn on a scale</span>
                <StripHead scale={scale} />
              </>
            ),
          }),
        ]
      : []),
    ...(drawn ? [column.display({ id: 'mean', header: () => <MeanHead quantity={drawn} /> })] : []),
    ...(model ? [column.display({ id: 'z', header: () => <QuantitySymbol symbol="z" /> })] : []),
    column.accessor(({ line }) => line.trial.by, { id: 'logged', header: 'Logged' }),
  ]);
}

function QuantityHead({
  quantity,
  withUnit = false,
}: {
  readonly quantity: Quantity;
  readonly withUnit?: boolean;
}) {
  const { name, symbol, unit } = quantity;
  return (
    <span title={name} className="whitespace-nowrap">
      {shortName(name)} <QuantitySymbol symbol={symbol} />
      {withUnit && unit !== '1' && (
        <>
          {' / '}
          <UnitText unit={unit} />
        </>
      )}
    </span>
  );
}

function MeanHead({ quantity: { unit } }: { readonly quantity: Quantity }) {
  return (
    <>
      Mean
      {unit !== '1' && (
        <>
          {' / '}
          <UnitText unit={unit} />
        </>
      )}
    </>
  );
}

function headClass(id: string): string {
  const base = 'pb-1.5 font-[550] first:pl-7 max-sm:first:pl-4';
  if (id.startsWith('setting')) return `${base} w-22 text-left`;
  switch (id) {
    case 'trial':
      return `${base} w-18 text-left`;
    case 'reading':
      return `${base} w-28 pr-5 text-right`;
    case 'strip':
      return `${base} pb-0`;
    case 'mean':
      return `${base} w-30 text-right`;
    case 'z':
      return `${base} w-15 text-right`;
    case 'logged':
      return `${base} w-34 pl-5 text-left`;
    default:
      return `${base} w-28 pr-3 text-right`;
  }
}
