import { useState } from 'react';
import { formatBare, formatValue } from '#shared/formatting/format-scalar.ts';
import type { Quantity } from '#shared/evidence/evidence.ts';
import { Menu } from '#src/components/menu.tsx';
import { Word } from '#src/components/word.tsx';
import { timeOrDay } from '#src/lib/dates/say-date.ts';
import { useEvidence } from '#src/lib/evidence/use-evidence.ts';
import { useProblem } from '#src/lib/problem/problem-context.ts';
import { lastName } from '#src/lib/say/last-name.ts';
import { bareScalar } from '../view/bare-scalar.ts';
import { showTyped } from '../view/show-typed.ts';
import type { SharedScale } from '../view/shared-scale.ts';
import type { SeriesView, TrialLine } from '../view/series-view.ts';
import { ExcludeDialog } from './exclude-dialog.tsx';
import { ReadingStrip } from './reading-strip.tsx';
import type { TableLine } from './trials-table.tsx';
import { useTrialActions } from './use-trial-actions.ts';

interface TrialRowProps {
  readonly row: TableLine;
  readonly view: SeriesView;
  readonly scale: SharedScale | null;
  readonly onCorrect: (line: TrialLine) => void;
}

export function TrialRow({ row, view, scale, onCorrect }: TrialRowProps) {
  const { settings } = useEvidence();
  const { line, group, isFirst, isLast } = row;
  const { excluded } = line.trial;
  const others = view.readings.filter(({ id }) => id !== view.drawn?.id);
  const edge = isLast ? 'border-b border-rule' : '';
  return (
    <tr
      id={line.name}
      className={`h-[27px] scroll-mt-24 target:bg-measured-wash ${edge} ${excluded ? 'hatched' : ''}`}
    >
      {view.settings.map((quantity) => (
        <td key={quantity.id} className="font-report text-lg whitespace-nowrap first:pl-7 max-sm:first:pl-4">
          {isFirst && <Setting quantity={quantity} group={group} />}
        </td>
      ))}
      <td className="first:pl-7">
        <TrialName line={line} row={row} view={view} onCorrect={onCorrect} />
      </td>
      {view.drawn && <ReadingCell line={line} quantity={view.drawn} />}
      {others.map((quantity) => (
        <ReadingCell key={quantity.id} line={line} quantity={quantity} />
      ))}
      {scale && (
        <td className="h-[27px] p-0">
          <ReadingStrip line={line} group={group} scale={scale} k={settings.k} />
        </td>
      )}
      {excluded ? (
        <ReasonCell line={line} span={1 + Number(view.drawn !== null) + Number(view.model !== null)} />
      ) : (
        <>
          {view.drawn && <MeanCell row={row} unit={view.drawn.unit} />}
          {view.model && <ZCell row={row} k={settings.k} />}
          <td className="truncate pl-5 text-xs text-ink-3">
            {lastName(line.trial.by)}, {timeOrDay(new Date(line.trial.at), new Date())}
          </td>
        </>
      )}
    </tr>
  );
}

function Setting({ quantity, group }: { readonly quantity: Quantity; readonly group: TableLine['group'] }) {
  const reading = group.settings[quantity.id];
  return reading ? <>{showTyped({ ...reading, u: undefined })}</> : <span className="text-ink-3">–</span>;
}

function ReadingCell({ line, quantity }: { readonly line: TrialLine; readonly quantity: Quantity }) {
  const { settings } = useEvidence();
  const reading = line.trial.values[quantity.id];
  const struck = line.trial.excluded ? 'text-ink-3 line-through' : 'text-measured';
  if (!reading) return <td className="pr-5 text-right text-xs text-ink-3">not read</td>;
  const isDrawn = line.value !== null && reading.unit === quantity.unit;
  return (
    <td className={`pr-5 text-right font-medium whitespace-nowrap ${struck}`}>
      {showTyped({ ...reading, u: undefined }, quantity.unit)}
      {isDrawn && line.u !== null && (
        <span className="text-xs font-normal text-ink-3">
          {' ± '}
          {reading.u ?? formatBare({ value: line.u, u: line.u }, quantity.unit, settings.rounding)}
        </span>
      )}
    </td>
  );
}

function MeanCell({ row: { group, isFirst }, unit }: { readonly row: TableLine; readonly unit: string }) {
  const { settings } = useEvidence();
  return (
    <td className="text-right font-[650] whitespace-nowrap text-measured">
      {isFirst && group.mean && bareScalar(group.mean, unit, settings.rounding)}
    </td>
  );
}

function ZCell({ row: { group, isFirst }, k }: { readonly row: TableLine; readonly k: number }) {
  const isBeyond = group.z !== null && Math.abs(group.z) > k;
  return (
    <td className={`text-right ${isBeyond ? 'font-[650] text-difference' : 'text-ink-2'}`}>
      {isFirst && group.z !== null && group.z.toFixed(1).replace('-', '\u2212')}
    </td>
  );
}

function ReasonCell({ line, span }: { readonly line: TrialLine; readonly span: number }) {
  const { mayWrite } = useProblem();
  const { bringBack } = useTrialActions();
  return (
    <td colSpan={span} className="relative p-0">
      <span className="absolute top-1/2 right-6 z-[1] flex w-max max-w-[410px] -translate-y-1/2 items-center gap-2.5 rounded-sm border border-rule bg-paper px-2 py-px text-xs text-ink">
        <span className="truncate" title={line.trial.excluded?.reason}>
          {line.trial.excluded?.reason}
        </span>
        {mayWrite && (
          <Word
            className="leading-4 whitespace-nowrap"
            onClick={() => void bringBack(line.trial.id, line.name)}
          >
            Bring back
          </Word>
        )}
      </span>
    </td>
  );
}

function TrialName({
  line,
  row,
  view,
  onCorrect,
}: {
  readonly line: TrialLine;
  readonly row: TableLine;
  readonly view: SeriesView;
  readonly onCorrect: (line: TrialLine) => void;
}) {
  const { mayWrite } = useProblem();
  const { settings } = useEvidence();
  const { exclude, bringBack, withdraw } = useTrialActions();
  const [isAsking, setIsAsking] = useState(false);
  const { trial, name } = line;
  if (!mayWrite || row.group.isBorrowed) {
    return <span className={trial.excluded ? 'text-ink-3 line-through' : ''}>{name}</span>;
  }
  const show = (value: number) =>
    formatValue({ value, u: line.u }, view.drawn?.unit ?? '1', settings.rounding);
  return (
    <>
      <Menu
        trigger={
          <button
            type="button"
            className={`-mx-1 rounded-xs px-1 hover:bg-sill ${trial.excluded ? 'text-ink-3 line-through' : ''}`}
            aria-label={`${name}, what to do with it`}
          >
            {name}
          </button>
        }
        items={[
          { words: 'Correct the reading', onSelect: () => onCorrect(line) },
          trial.excluded
            ? { words: 'Bring back', onSelect: () => void bringBack(trial.id, name) }
            : { words: 'Exclude, with a reason', onSelect: () => setIsAsking(true), isRisk: true },
          { words: `Withdraw ${name}`, onSelect: () => void withdraw(trial.id, name), isRisk: true },
        ]}
      />
      {isAsking && (
        <ExcludeDialog
          line={line}
          group={row.group}
          show={show}
          onClose={() => setIsAsking(false)}
          onExclude={(reason) => {
            setIsAsking(false);
            void exclude(trial.id, name, reason);
          }}
        />
      )}
    </>
  );
}
