import { useMemo } from 'react';
import type { Series } from '#shared/evidence/evidence.ts';
import { fromSi } from '#shared/units/convert.ts';
import { parseUnit } from '#shared/units/parse-unit.ts';
import { QuantitySymbol } from '#src/components/quantity-symbol.tsx';
import { Word } from '#src/components/word.tsx';
import { useEvidence } from '#src/lib/evidence/use-evidence.ts';
import { countOf } from '#src/lib/say/count-of.ts';
import { sharedScale } from '../view/shared-scale.ts';
import { showTyped } from '../view/show-typed.ts';
import type { SeriesView, TrialLine } from '../view/series-view.ts';
import { TrialsTable } from './trials-table.tsx';

interface SeriesSectionProps {
  readonly view: SeriesView;
  readonly isOpen: boolean;
  readonly onToggle: () => void;
  readonly onChange: (() => void) | null;
  readonly onCorrect: (line: TrialLine) => void;
  readonly onEnter: () => void;
}

/** One series: what it holds, how many trials, and its table while it is unfolded. */
export function SeriesSection({ view, isOpen, onToggle, onChange, onCorrect, onEnter }: SeriesSectionProps) {
  const { settings } = useEvidence();
  const scale = useMemo(() => {
    const unit = view.drawn ? parseUnit(view.drawn.unit) : null;
    return unit?.ok ? sharedScale(view.groups, settings.k, (value) => fromSi(value, unit.unit)) : null;
  }, [view, settings.k]);
  return (
    <section aria-label={`Series ${view.series.letter}`}>
      <header className="flex min-h-10 flex-wrap items-center gap-x-3 border-y border-rule bg-sill px-7 py-1.5 text-sm [section+section>&]:border-t-0 max-sm:px-4">
        <h2 className="font-[650]">Series {view.series.letter}</h2>
        <SeriesWords series={view.series} />
        <span className="ml-auto flex items-center gap-3.5 text-xs text-ink-2">
          <span>{countsOf(view)}</span>
          {onChange && <Word onClick={onChange}>Change</Word>}
          <Word aria-expanded={isOpen} onClick={onToggle}>
            {isOpen ? 'Fold' : 'Unfold'}
          </Word>
        </span>
      </header>
      {isOpen &&
        (view.groups.length > 0 ? (
          <TrialsTable view={view} scale={scale} onCorrect={onCorrect} onEnter={onEnter} />
        ) : (
          <p className="px-7 py-3 text-sm font-report text-ink-3 italic max-sm:px-4">
            {view.series.letter}1: write the first reading in the bar at the foot.
          </p>
        ))}
    </section>
  );
}

function SeriesWords({ series }: { readonly series: Series }) {
  const { quantities } = useEvidence();
  const held = Object.entries(series.held).flatMap(([id, reading]) => {
    const quantity = quantities.find((candidate) => candidate.id === id);
    return quantity ? [{ quantity, reading }] : [];
  });
  return (
    <span className="text-ink-2">
      {series.name}
      {held.map(({ quantity, reading }) => (
        <span key={quantity.id} className="whitespace-nowrap">
          {' · '}
          <QuantitySymbol symbol={quantity.symbol} /> = {showTyped(reading)}
        </span>
      ))}
    </span>
  );
}

/** "19 trials, one excluded, with A1 and A2". */
function countsOf({ total, excluded, groups }: SeriesView): string {
  const borrowed = groups
    .filter(({ isBorrowed }) => isBorrowed)
    .flatMap(({ lines }) => lines.map(({ name }) => name));
  const parts = [countOf(total, 'trial')];
  if (excluded > 0) parts.push(`${excluded} excluded`);
  if (borrowed.length > 0 && borrowed.length <= 4) parts.push(`with ${borrowed.join(' and ')}`);
  return parts.join(', ');
}
