import { Navigate, useLocation } from 'react-router-dom';
import { paths } from '#src/lib/paths.ts';
import { lastStation } from '#src/lib/preferences/last-station.ts';
import { useProblem } from '#src/lib/problem/problem-context.ts';

/** A problem opens at the station that was last used. */
export function Component() {
  const { address } = useProblem();
  const { hash } = useLocation();
  return <Navigate replace to={paths.station(address, lastStation(address)) + hash} />;
}
