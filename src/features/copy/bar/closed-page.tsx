import { useQuery } from '@tanstack/react-query';
import { Mark } from '#src/components/mark.tsx';
import { Loading } from '#src/components/loading.tsx';
import { useTitle } from '#src/lib/use-title.ts';
import { questionsQuery } from '../api/questions.ts';
import { KeyForm } from '../channel/key-form.tsx';
import { sayTime } from '../channel/say-time.ts';

interface ClosedPageProps {
  readonly token: string;
  /** It was open on this screen until now. */
  readonly wasOpen: boolean;
}

/** In the place of a copy that is not open: one and the same for all that may be the reason. */
export function ClosedPage({ token, wasOpen }: ClosedPageProps) {
  const questions = useQuery(questionsQuery(token));
  useTitle('No copy is open here');
  if (questions.isPending) return <Loading what="the page" />;
  return (
    <main
      id="page"
      tabIndex={-1}
      data-region="page"
      className="copy-hatched min-h-dvh px-4 py-16 max-sm:py-8"
    >
      <div className="page-sheet mx-auto grid max-w-[640px] gap-5 px-9 py-9 max-sm:px-5">
        <Mark size={34} />
        <div role={wasOpen ? 'alert' : undefined}>
          <h1 className="h1">{wasOpen ? 'This copy is closed' : 'No copy is open here'}</h1>
          <p className="mt-2 font-report text-report text-ink-2">
            {wasOpen
              ? 'Its time is over, or the team that lent it has taken it back. The report is gone from this screen; what you noted yourselves is yours.'
              : 'The address may have a slip in it, its time may not have come or may be over, or the copy was taken back. Ask the team that lent it.'}
          </p>
        </div>
        {questions.data ? (
          <section aria-label="Our questions" className="border-t border-rule pt-4">
            <h2 className="h2">Our questions</h2>
            {questions.data.questions.length === 0 && <p className="mt-1 text-ink-2">None was written.</p>}
            <ol className="mt-2 grid gap-3.5">
              {questions.data.questions.map(({ id, text, about, seconds }, index) => (
                <li key={id} className="border-t border-hair pt-2.5 first:border-0">
                  <p className="font-report text-[17px]/6 font-medium">
                    <span className="mr-2 font-normal text-ink-3">{index + 1}</span>
                    {text}
                  </p>
                  <p className="mt-0.5 flex justify-between gap-4 text-xs text-ink-2">
                    <span>{about?.kind === 'passage' ? `“${about.quote}”` : about?.words}</span>
                    <span>{sayTime(seconds)}</span>
                  </p>
                </li>
              ))}
            </ol>
          </section>
        ) : (
          <section aria-label="Our questions" className="border-t border-rule pt-4">
            <h2 className="font-report text-xl font-medium">Did you write questions here?</h2>
            <p className="mt-1 mb-3 text-ink-2">They stay yours: show the key that your team set for them.</p>
            <KeyForm token={token} words="Show our questions" />
          </section>
        )}
      </div>
    </main>
  );
}
