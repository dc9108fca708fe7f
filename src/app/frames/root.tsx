import { lazy, Suspense, useEffect, useRef } from 'react';
import { Outlet, ScrollRestoration, useLocation } from 'react-router-dom';
import { PassingSill, SillVoice } from '#src/components/sill.tsx';
import { endedSession } from '#src/lib/session/sign-in-again.ts';
import { useStore } from '#src/lib/store/use-store.ts';
import { useRegionRing } from '../keys/use-region-ring.ts';
import { SkipLink } from './skip-link.tsx';

const SignInAgain = lazy(async () => ({
  default: (await import('#src/features/session/components/sign-in-again.tsx')).SignInAgain,
}));

/** What every page has: the skip link, the sill's voice, and the way to sign in again in place. */
export function Root() {
  const ended = useStore(endedSession);
  useRegionRing();
  useFocusOnNewPage();
  return (
    <>
      <SkipLink />
      <Outlet />
      <PassingSill />
      <SillVoice />
      {ended && (
        <Suspense>
          <SignInAgain ended={ended} />
        </Suspense>
      )}
      <ScrollRestoration />
    </>
  );
}

/** After going to another page, a focus that was left on nothing goes to the page. */
function useFocusOnNewPage(): void {
  const { pathname } = useLocation();
  const former = useRef(pathname);
  useEffect(() => {
    if (former.current === pathname) return;
    former.current = pathname;
    if (document.activeElement === document.body || document.activeElement === null) {
      document.getElementById('page')?.focus({ preventScroll: true });
    }
  }, [pathname]);
}
