import { Outlet } from 'react-router-dom';
import { TeamTopLine } from '../top-line/team-top-line.tsx';

/** Screens of a team under the team's own top line. */
export function Component() {
  return (
    <>
      <TeamTopLine />
      <Outlet />
    </>
  );
}
