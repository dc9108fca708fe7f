import { trialsTable } from '#shared/report/trials-table.ts';
import { useFindingsSnapshot } from '#src/lib/evidence/use-evidence.ts';
import { countOf } from '#src/lib/say/count-of.ts';
import { dayAndMonth } from '#src/lib/dates/say-date.ts';
import { SeriesTable } from '../views/series-table.tsx';

/** The trials behind a frozen report, series by series, with why some are left out. */
export function FrozenTrials() {
  const { evidence, findings } = useFindingsSnapshot();
  if (evidence.series.length === 0) return null;
  return (
    <section
      id="trials"
      aria-label="Trials behind this report"
      className="report-page page-sheet frozen-trials"
    >
      <h2 className="h2">Trials behind this report</h2>
      {evidence.series.map(({ id, letter, name }) => {
        const view = trialsTable(id, evidence, findings);
        const excluded = evidence.trials.filter((trial) => trial.series === id && trial.excluded);
        const days = daysOf(evidence.trials.filter((trial) => trial.series === id).map(({ at }) => at));
        return (
          view && (
            <div key={id} className="mt-7">
              <h3 className="h3">
                Series {letter}
                {name && `, ${name}`}
              </h3>
              <p className="mt-0.5 mb-2 text-sm text-ink-2">
                {countOf(view.trials, 'trial')}
                {view.held !== null && `, held at ${view.held}`}
                {days !== '' && `, ${days}`}.
              </p>
              <div
                className="relative overflow-x-auto"
                role="region"
                aria-label={`Series ${letter}`}
                tabIndex={0}
              >
                <SeriesTable view={view} />
              </div>
              {excluded.length > 0 && (
                <ul className="mt-2 text-sm text-ink-2">
                  {excluded.map((trial) => (
                    <li key={trial.id}>
                      {letter}
                      {trial.number} excluded: {trial.excluded?.reason}
                    </li>
                  ))}
                </ul>
              )}
            </div>
          )
        );
      })}
    </section>
  );
}

/** "21 February", or "21 February to 1 March". */
function daysOf(moments: readonly string[]): string {
  const sorted = moments.toSorted();
  const [first, last] = [sorted[0], sorted.at(-1)];
  if (first === undefined || last === undefined) return '';
  const words = [dayAndMonth(new Date(first)), dayAndMonth(new Date(last))];
  return words[0] === words[1] ? `${words[0]}` : `${words[0]} to ${words[1]}`;
}
