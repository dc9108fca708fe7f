import type { Role } from '#shared/contracts/session.ts';
import type { Fight, Person, ProblemSummary } from '#shared/contracts/teams.ts';
import { Word } from '#src/components/word.tsx';
import { ROLE_OPTIONS, ROLE_WORDS, stageWords } from '../sentences/people-words.ts';

interface PersonRowProps {
  readonly person: Person;
  readonly fights: readonly Fight[];
  readonly problems: readonly ProblemSummary[];
  readonly now: Date;
  /** null: who looks may change nothing. */
  readonly actions: {
    readonly onRole: (role: Role) => void;
    readonly onRemove: () => void;
  } | null;
}

/** Who it is, what they work on, and when they take the stage. */
export function PersonRow({ person, fights, problems, now, actions }: PersonRowProps) {
  const works = problems.filter(({ owners }) => owners.some(({ id }) => id === person.id));
  return (
    <tr className="border-b border-hair align-top max-md:block max-md:py-4">
      <th scope="row" className="py-4 pr-6 text-left font-normal max-md:block max-md:p-0">
        <span className="font-report text-[21px]/7 font-medium">{person.name}</span>
        <span className="block text-sm text-ink-2">{ROLE_WORDS[person.role]}</span>
        {actions && (
          <span className="mt-1.5 flex flex-wrap items-center gap-x-4 gap-y-1 text-sm">
            <label className="inline-flex items-center gap-2 text-ink-2">
              <span>
                Role<span className="sr-only"> of {person.name}</span>
              </span>
              <select
                value={person.role}
                onChange={(event) => actions.onRole(event.target.value as Role)}
                className="h-8 rounded-md border-[1.25px] border-edge bg-paper px-1.5 text-ink"
              >
                {ROLE_OPTIONS.map(({ value, words }) => (
                  <option key={value} value={value}>
                    {words}
                  </option>
                ))}
              </select>
            </label>
            <Word onClick={actions.onRemove}>
              Remove<span className="sr-only"> {person.name}</span>
            </Word>
          </span>
        )}
      </th>
      <td className="py-4 pr-6 text-sm max-md:block max-md:pt-2 max-md:pb-0">
        {person.role === 'advisor' && works.length === 0 ? (
          <span className="text-ink-3">advises</span>
        ) : (
          <>
            <span className="text-ink-2 md:hidden">works on </span>
            {works.map(({ title }) => title).join(', ') || <span className="text-ink-3">no problem yet</span>}
          </>
        )}
      </td>
      {person.role === 'advisor' && fights.length > 0 ? (
        <td colSpan={fights.length} className="py-4 text-sm text-ink-3 max-md:block max-md:py-0">
          advisors do not take the stage
        </td>
      ) : (
        fights.map((fight) => (
          <FightCell key={fight.id} fight={fight} person={person} problems={problems} now={now} />
        ))
      )}
    </tr>
  );
}

function FightCell({
  fight,
  person,
  problems,
  now,
}: Pick<PersonRowProps, 'person' | 'problems' | 'now'> & { readonly fight: Fight }) {
  const stages = fight.stages.filter((stage) => stage.person === person.id);
  return (
    <td className="py-4 pr-4 text-sm max-md:block max-md:py-0">
      <span className="text-ink-2 md:hidden">{fight.name}: </span>
      {stages.length === 0 && <span className="text-ink-3">not on stage</span>}
      {stages.map(({ role, problem }) => (
        <span key={`${role} ${problem}`} className="block max-md:inline">
          <i className="font-report text-[16px]">{stageWords(role, fight, now)}</i>{' '}
          <span className="md:block">
            {problems.find(({ number }) => number === problem)?.title ?? `problem ${problem}`}
          </span>
        </span>
      ))}
    </td>
  );
}
