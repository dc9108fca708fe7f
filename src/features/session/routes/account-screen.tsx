import { useNavigate } from 'react-router-dom';
import { Button } from '#src/components/button.tsx';
import { Choice, ChoiceGroup } from '#src/components/choice-group.tsx';
import { Notice } from '#src/components/notice.tsx';
import { WordLink } from '#src/components/word.tsx';
import { sentenceOf } from '#src/lib/api/api-error.ts';
import { paths } from '#src/lib/paths.ts';
import { digitKeys } from '#src/lib/preferences/digit-keys.ts';
import { themeChoice } from '#src/lib/preferences/theme.ts';
import { useSession } from '#src/lib/session/use-session.ts';
import { useStore } from '#src/lib/store/use-store.ts';
import { useTitle } from '#src/lib/use-title.ts';
import { useEndSession } from '../api/end-session.ts';
import { PassphraseForm } from '../components/passphrase-form.tsx';

const THEMES = [
  ['system', 'as the system has it'],
  ['light', 'light'],
  ['dark', 'dark'],
] as const;

/** One's own account: teams, passphrase, keys, light or dark, and the way out. */
export function Component() {
  const { user, teams } = useSession();
  const theme = useStore(themeChoice);
  const digits = useStore(digitKeys);
  const leave = useEndSession();
  const navigate = useNavigate();
  useTitle('Your account');
  const signOut = () => leave.mutate(undefined, { onSuccess: () => void navigate('/') });
  return (
    <main id="page" tabIndex={-1} data-region="page" className="page-top mx-auto max-w-[760px] px-4.5 pb-24">
      <h1 className="h1">{user.name}</h1>
      <p className="mt-2 font-report text-report text-ink-2">{user.email}</p>
      <ul className="mt-1 font-report text-report text-ink-2">
        {teams.map(({ slug, name, university, role }) => (
          <li key={slug}>
            {role} of <WordLink to={paths.season(slug)}>{name}</WordLink>, {university}
          </li>
        ))}
      </ul>
      <div className="page-sheet mt-6 grid gap-7 px-5 py-6 sm:px-7">
        <section aria-label="Passphrase">
          <h2 className="mb-3.5 font-report text-[21px]/7 font-medium">Passphrase</h2>
          <PassphraseForm />
        </section>
        <section aria-label="This browser">
          <h2 className="mb-3.5 font-report text-[21px]/7 font-medium">This browser</h2>
          <ChoiceGroup legend="Light or dark">
            {THEMES.map(([value, words]) => (
              <Choice
                key={value}
                kind="radio"
                name="theme"
                words={words}
                checked={theme === value}
                onChange={() => themeChoice.set(value)}
              />
            ))}
          </ChoiceGroup>
          <div className="mt-3">
            <Choice
              kind="checkbox"
              words="The digits 1 to 3 go to the stations, and 0 to the Season, when no field has the focus"
              checked={digits === 'on'}
              onChange={(event) => digitKeys.set(event.target.checked ? 'on' : 'off')}
            />
          </div>
        </section>
        <section aria-label="Leave">
          {leave.error && <Notice title={sentenceOf(leave.error)} className="mb-4" />}
          <Button busy={leave.isPending} onClick={signOut}>
            Sign out
          </Button>
        </section>
      </div>
    </main>
  );
}
