import { useCallback, useMemo, useRef, useState } from 'react';
import { useParams } from 'react-router-dom';
import { Word } from '#src/components/word.tsx';
import { useFindingsSnapshot } from '#src/lib/evidence/use-evidence.ts';
import { useProblem } from '#src/lib/problem/problem-context.ts';
import { Cautions } from '../cautions/cautions.tsx';
import { EntryBar, type EntryBarHandle } from '../components/entry-bar.tsx';
import { FirstSeries } from '../components/first-series.tsx';
import { PastePanel } from '../components/paste-panel.tsx';
import { SeriesSection } from '../components/series-section.tsx';
import { TrialsHead } from '../components/trials-head.tsx';
import { Register } from '../register/register.tsx';
import { SeriesForm } from '../register/series-form.tsx';
import { seriesView, type TrialLine } from '../view/series-view.ts';

/** What is open on the screen besides the log itself. */
type OpenForm = { readonly kind: 'series'; readonly id: string | null } | { readonly kind: 'paste' } | null;

/** The log of a problem's trials, its register of quantities, and the next trial at the foot. */
export function TrialsStation() {
  const { evidence, findings } = useFindingsSnapshot();
  const { mayWrite } = useProblem();
  const current = useCurrentSeries();
  const [toggled, setToggled] = useState<Readonly<Record<string, boolean>>>({});
  const [form, setForm] = useState<OpenForm>(null);
  const [correcting, setCorrecting] = useState<TrialLine | null>(null);
  const entry = useRef<EntryBarHandle>(null);
  const views = useMemo(
    () => evidence.series.map((series) => seriesView(series, evidence, findings)),
    [evidence, findings],
  );
  const focusEntry = useCallback(() => entry.current?.focus(), []);
  const close = () => setForm(null);
  const shown = correcting ? views.find((view) => view.series.id === correcting.trial.series) : null;
  const view = shown ?? views.find(({ series }) => series.id === current.id) ?? views.at(-1);
  return (
    <main
      id="page"
      tabIndex={-1}
      data-region="page"
      className={`page-top mx-auto grid max-w-[1360px] grid-cols-[minmax(0,1004fr)_minmax(0,332fr)] items-start gap-6 max-[1200px]:grid-cols-1 max-[1440px]:mx-10 max-sm:mx-0 ${mayWrite ? 'pb-40 max-sm:pb-0' : 'pb-16'}`}
    >
      <section className="page-sheet pt-6 pb-2" aria-label="Log">
        <TrialsHead now={new Date()} />
        {views.map((seriesOf) => (
          <SeriesSection
            key={seriesOf.series.id}
            view={seriesOf}
            isOpen={toggled[seriesOf.series.id] ?? seriesOf === view}
            onToggle={() => {
              const isOpen = toggled[seriesOf.series.id] ?? seriesOf === view;
              setToggled((before) => ({ ...before, [seriesOf.series.id]: !isOpen }));
              if (!isOpen) current.choose(seriesOf.series.id);
            }}
            onChange={mayWrite ? () => setForm({ kind: 'series', id: seriesOf.series.id }) : null}
            onCorrect={setCorrecting}
            onEnter={focusEntry}
          />
        ))}
        {form?.kind === 'paste' && view && (
          <PastePanel key={view.series.id} series={view.series} onClose={close} />
        )}
        {form?.kind === 'series' ? (
          <SeriesForm key={form.id ?? 'new'} id={form.id} onClose={close} />
        ) : (
          mayWrite && (
            <div className="px-7 py-3.5 text-sm max-sm:px-4">
              {views.length === 0 ? (
                <FirstSeries onStart={() => setForm({ kind: 'series', id: null })} />
              ) : (
                <Word onClick={() => setForm({ kind: 'series', id: null })}>New series</Word>
              )}
            </div>
          )
        )}
      </section>
      <div>
        <Register />
        <Cautions />
      </div>
      {mayWrite && view && view.series.readings.length > 0 && (
        <EntryBar
          key={`${view.series.id} ${correcting?.trial.id ?? 'next'}`}
          ref={entry}
          series={view.series}
          view={view}
          correcting={correcting}
          onCorrected={() => setCorrecting(null)}
          onPaste={() => setForm({ kind: 'paste' })}
        />
      )}
    </main>
  );
}

/** The series that the next trial goes to: the one in the address, else where the last trial was logged. */
function useCurrentSeries() {
  const { series: inAddress } = useParams();
  const { evidence } = useFindingsSnapshot();
  const [chosen, choose] = useState<string | null>(null);
  const named = evidence.series.find(({ letter, id }) => letter === inAddress || id === inAddress)?.id;
  const last = evidence.trials.reduce<(typeof evidence.trials)[number] | null>(
    (latest, trial) => (!latest || trial.order > latest.order ? trial : latest),
    null,
  );
  return { id: chosen ?? named ?? last?.series ?? null, choose };
}
