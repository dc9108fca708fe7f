import { Outlet } from 'react-router-dom';
import { useSession } from '#src/lib/session/use-session.ts';
import { ConnectionWords } from '../top-line/connection-words.tsx';
import { TopLine } from '../top-line/top-line.tsx';

/** Screens that belong to a person and to no team. */
export function Component() {
  const { user } = useSession();
  return (
    <>
      <TopLine
        home="/"
        small="Holdwater"
        name="Your account"
        label="Places"
        stations={[{ to: '/', words: 'Season', isHere: false, cup: null }]}
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
