import type { Reading, Series } from '#shared/evidence/evidence.ts';
import { useFindingsSnapshot } from '#src/lib/evidence/use-evidence.ts';
import { deviation } from '../view/deviation.ts';
import type { SeriesView } from '../view/series-view.ts';

/** Before logging: what the model predicts at these settings, and how far the reading is from it. */
export function EntrySentence({
  series,
  view,
  values,
}: {
  readonly series: Series;
  readonly view: SeriesView;
  readonly values: Readonly<Record<string, Reading>>;
}) {
  const { evidence, findings } = useFindingsSnapshot();
  const found = deviation(evidence, findings, series, view, values);
  if (!found) return null;
  if (found.kind === 'none') return <p>{found.sentence}</p>;
  return (
    <p>
      Predicted <b className="font-semibold text-predicted">{found.predicted}</b>
      {found.away === null ? (
        '.'
      ) : (
        <>
          , so this reads{' '}
          <b className={`font-semibold ${found.isBeyond ? 'text-difference' : 'text-ink'}`}>{found.away}</b>.
        </>
      )}
      {found.line && <> {found.line}</>}
    </p>
  );
}
