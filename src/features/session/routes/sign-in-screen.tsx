import { useQuery } from '@tanstack/react-query';
import { Navigate, useSearchParams } from 'react-router-dom';
import { Mark } from '#src/components/mark.tsx';
import { Notice } from '#src/components/notice.tsx';
import { WordLink } from '#src/components/word.tsx';
import { sentenceOf } from '#src/lib/api/api-error.ts';
import { paths } from '#src/lib/paths.ts';
import { sessionQuery } from '#src/lib/session/use-session.ts';
import { useTitle } from '#src/lib/use-title.ts';
import { afterSignIn } from '../components/after-sign-in.ts';
import { CredentialsForm } from '../components/credentials-form.tsx';
import { DemoCopy } from '../components/demo-copy.tsx';
import { DemoSignIns } from '../components/demo-sign-ins.tsx';
import { NoTeam } from '../components/no-team.tsx';
import { SpoutFigure } from '../components/spout/spout-figure.tsx';

/** The question, and the way in. Who is signed in goes on to the Season. */
export function Component() {
  const { data: session, error, isPending } = useQuery(sessionQuery);
  const [search] = useSearchParams();
  useTitle('Sign in');
  if (session) {
    const to = afterSignIn(session, search.get('to'));
    return to === null ? <NoTeam name={session.user.name} /> : <Navigate replace to={to} />;
  }
  if (isPending) return null;
  return (
    <main
      id="page"
      tabIndex={-1}
      data-region="page"
      className="relative min-h-dvh overflow-hidden lg:h-[900px] lg:min-h-0"
    >
      <div className="relative mx-auto max-w-[1440px] lg:h-full">
        <SpoutFigure
          viewBox="0 0 1440 900"
          className="absolute top-[calc(716px_-_min(100vw,1440px)*0.49722)] left-0 w-[min(100vw,1440px)] overflow-visible max-lg:hidden"
        />
        <div className="flex items-center gap-3 px-5 pt-6 font-report text-[24px]/[30px] font-semibold sm:px-14 lg:absolute lg:top-10 lg:left-14 lg:p-0">
          <Mark size={38} />
          Holdwater
        </div>
        <div className="px-5 pt-10 sm:px-14 lg:absolute lg:top-[196px] lg:left-[32.64%] lg:w-[560px] lg:p-0">
          <h1 className="font-report text-[46px]/[50px] font-medium tracking-[-.02em] lg:text-[76px]/[80px]">
            Does it
            <br />
            hold water?
          </h1>
          <p className="mt-4 max-w-[430px] font-report text-[19px]/[28px] text-pretty text-ink-2 lg:text-[21px]/[31px]">
            Log the trials, write the model, face the difference, and stand up to the opponent.
          </p>
        </div>
        <div className="max-w-[460px] px-5 pt-9 pb-6 sm:px-14 lg:absolute lg:top-[176px] lg:right-[4.58%] lg:w-[352px] lg:p-0">
          <h2 className="mb-4.5 font-report text-xl font-medium">Sign in</h2>
          {error && <Notice title={sentenceOf(error)} className="mb-4" />}
          {/* The session is set on success, and this screen goes on by itself. */}
          <CredentialsForm onSignedIn={() => undefined} />
          <div className="mt-4.5 border-t border-rule pt-4">
            <p className="mb-2 text-sm">
              <WordLink to={paths.forgotten()}>Forgotten passphrase?</WordLink>
            </p>
            <DemoSignIns onSignedIn={() => undefined} />
            <DemoCopy />
          </div>
        </div>
        <p className="px-5 pb-8 text-xs/[19px] text-ink-3 sm:px-14 lg:absolute lg:top-[744px] lg:right-14 lg:w-[362px] lg:p-0">
          A team’s captain invites its people by mail. Ask yours for an invitation.
        </p>
        <SpoutFigure viewBox="0 250 960 510" className="w-full overflow-visible pb-6 lg:hidden" />
      </div>
    </main>
  );
}
