import { useParams } from 'react-router-dom';
import { useMemo } from 'react';
import { useTeam } from '#src/lib/team/team-context.ts';
import { NotFoundScreen } from '../screens/not-found-screen.tsx';
import { LoadedProblem } from './loaded-problem.tsx';

/** Reads the problem's number from the address. */
export function Component() {
  const { problem: text = '' } = useParams();
  const { team } = useTeam();
  const address = useMemo(() => ({ team: team.slug, number: Number(text) }), [team.slug, text]);
  if (!/^[1-9]\d{0,2}$/.test(text)) return <NotFoundScreen />;
  return <LoadedProblem key={`${address.team}/${address.number}`} address={address} />;
}
