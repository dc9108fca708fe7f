import { Outlet, useLocation } from 'react-router-dom';
import { paths } from '#src/lib/paths.ts';
import { useSession } from '#src/lib/session/use-session.ts';
import { ConnectionWords } from '../top-line/connection-words.tsx';
import { TopLine } from '../top-line/top-line.tsx';

/** Screens that belong to a person and to no team. */
export function Component() {
  const { user } = useSession();
  const { pathname } = useLocation();
  const isAdmin = pathname === paths.admin();
  return (
    <>
      <TopLine
        home="/"
        small="Holdwater"
        name={isAdmin ? 'Installation' : 'Your account'}
        label="Places"
        stations={
          user.isAdministrator
            ? [
                { to: paths.admin(), words: 'Installation', isHere: isAdmin, cup: null },
                { to: paths.account(), words: 'Account', isHere: !isAdmin, cup: null },
              ]
            : [{ to: '/', words: 'Season', isHere: false, cup: null }]
        }
        others={[]}
        aside={
          <>
            <b className="text-ink">{user.name}</b>
            <br />
            <ConnectionWords>{user.email}</ConnectionWords>
          </>
        }
      />
      <Outlet />
    </>
  );
}
