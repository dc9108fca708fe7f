import { createContext, useContext } from 'react';
import type { Role } from '#shared/contracts/session.ts';
import type { Team } from '#shared/contracts/teams.ts';

export interface OpenTeam {
  readonly team: Team;
  readonly role: Role;
}

export const TeamContext = createContext<OpenTeam | null>(null);

export function useTeam(): OpenTeam {
  const open = useContext(TeamContext);
  if (!open) throw new Error('useTeam: needs to stand inside the frame of a team');
  return open;
}
