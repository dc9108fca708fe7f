import type { Session } from '#shared/contracts/session.ts';
import { paths } from '#src/lib/paths.ts';
import { recall } from '#src/lib/preferences/preference.ts';

/** Where a person goes: to the page they asked for if it is one of ours, else to the Season of the team last open. */
export function afterSignIn(session: Session, asked: string | null): string | null {
  if (asked !== null && /^\/(?!\/|\\)/.test(asked) && asked !== '/') return asked;
  if (session.user.isAdministrator) return paths.admin();
  const last = recall('team');
  const team = session.teams.find(({ slug }) => slug === last) ?? session.teams[0];
  return team ? paths.season(team.slug) : null;
}
