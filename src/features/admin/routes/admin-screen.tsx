import { useQuery } from '@tanstack/react-query';
import type { ReactNode } from 'react';
import { Loading } from '#src/components/loading.tsx';
import { Notice } from '#src/components/notice.tsx';
import { Word, WordLink } from '#src/components/word.tsx';
import { sentenceOf } from '#src/lib/api/api-error.ts';
import { useSession } from '#src/lib/session/use-session.ts';
import { useTitle } from '#src/lib/use-title.ts';
import { allPeopleQuery, allTeamsQuery } from '../api/admin.ts';
import { AccountList } from '../components/account-list.tsx';
import { NewTeamForm } from '../components/new-team-form.tsx';
import { TeamList } from '../components/team-list.tsx';

/** Looking after the installation: its teams and accounts, and no problem of any team. */
export function Component() {
  const { user } = useSession();
  const mayLook = user.isAdministrator === true;
  const teams = useQuery({ ...allTeamsQuery, enabled: mayLook });
  const people = useQuery({ ...allPeopleQuery, enabled: mayLook });
  useTitle('Teams and accounts');
  if (!mayLook) {
    return (
      <AdminPage title="There is nothing here">
        <p className="font-report text-report text-ink-2">
          This address leads nowhere. <WordLink to="/">Go to your Season</WordLink>
        </p>
      </AdminPage>
    );
  }
  const error = teams.error ?? people.error;
  const again = () => void Promise.all([teams.refetch(), people.refetch()]);
  if (!error && !(teams.data && people.data)) return <Loading what="teams and accounts" />;
  return (
    <AdminPage title="Teams and accounts">
      {error && (
        <Notice title="Teams and accounts could not be brought." className="mb-4">
          {sentenceOf(error)} <Word onClick={again}>Try again</Word>
        </Notice>
      )}
      {teams.data && (
        <AdminSheet id="teams" title="Teams">
          <TeamList teams={teams.data} />
          <NewTeamForm />
        </AdminSheet>
      )}
      {people.data && (
        <AdminSheet id="accounts" title="Accounts">
          <AccountList people={people.data} />
        </AdminSheet>
      )}
    </AdminPage>
  );
}

function AdminPage({ title, children }: { readonly title: string; readonly children: ReactNode }) {
  return (
    <main
      id="page"
      tabIndex={-1}
      data-region="page"
      className="page-top mx-auto max-w-[1000px] px-8 pb-16 max-sm:px-0"
    >
      <h1 className="h1 mb-5 max-sm:px-4.5">{title}</h1>
      {children}
    </main>
  );
}

interface AdminSheetProps {
  readonly id: string;
  readonly title: string;
  readonly children: ReactNode;
}

function AdminSheet({ id, title, children }: AdminSheetProps) {
  return (
    <section aria-labelledby={id} className="page-sheet mb-6 px-8 pt-6 pb-3 max-sm:px-4.5">
      <h2 id={id} className="border-b-[1.25px] border-ink pb-1 font-report text-[21px]/7 font-medium">
        {title}
      </h2>
      {children}
    </section>
  );
}
