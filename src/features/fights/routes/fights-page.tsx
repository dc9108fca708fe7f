import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import type { ProblemSummary } from '#shared/contracts/teams.ts';
import type { Event } from '#shared/talk/event.ts';
import { Loading } from '#src/components/loading.tsx';
import { Notice } from '#src/components/notice.tsx';
import { Word, WordLink } from '#src/components/word.tsx';
import { sentenceOf } from '#src/lib/api/api-error.ts';
import { paths } from '#src/lib/paths.ts';
import { useTeam } from '#src/lib/team/team-context.ts';
import { eventsQuery } from '../api/events.ts';
import { fightsQuery } from '../api/fights.ts';
import { EventForm } from '../components/event-form.tsx';
import { EventRow } from '../components/event-row.tsx';
import { EXAMPLE_EVENTS } from '../components/example-events.ts';
import { FightForm } from '../components/fight-form.tsx';
import { FightRow } from '../components/fight-row.tsx';

/** The row whose form is open: its id, or what a new one begins from. */
type Opened =
  { readonly fight: string | null } | { readonly event: string } | { readonly start: Event } | null;

/** Every fight of the season with its stages, and the events whose rules they are held by. */
export function FightsPage({ problems }: { readonly problems: readonly ProblemSummary[] }) {
  const { team, role } = useTeam();
  const fights = useQuery(fightsQuery(team.slug));
  const events = useQuery(eventsQuery(team.slug));
  const [opened, setOpened] = useState<Opened>(null);
  const mayChange = role === 'captain';
  const close = () => setOpened(null);
  const failure = fights.error ?? events.error;
  if ((!fights.data || !events.data) && !failure) return <Loading what="the fights" />;
  const known = events.data ?? [];
  return (
    <main
      id="page"
      tabIndex={-1}
      data-region="page"
      className="page-top mx-auto max-w-[1304px] px-4.5 pb-16 sm:px-8"
    >
      <header className="mb-5">
        <h1 className="h1">Fights and events</h1>
        <p className="mt-0.5 font-report text-report text-ink-2">
          When we are on stage and with what, and the rules of the events.{' '}
          {!mayChange && 'The captain sets them. '}
          <WordLink to={paths.season(team.slug)}>Back to the Season</WordLink>
        </p>
      </header>
      {failure && (
        <Notice title="The fights could not be brought." className="my-4">
          {sentenceOf(failure)}{' '}
          <Word
            onClick={() => {
              void fights.refetch();
              void events.refetch();
            }}
          >
            Try again
          </Word>
        </Notice>
      )}
      <section aria-label="Fights" className="page-sheet divide-y divide-hair px-5 sm:px-7">
        {fights.data?.map((fight) =>
          opened && 'fight' in opened && opened.fight === fight.id ? (
            <FightForm
              key={fight.id}
              team={team}
              fight={fight}
              events={known}
              problems={problems}
              onDone={close}
            />
          ) : (
            <FightRow
              key={fight.id}
              team={team}
              fight={fight}
              event={known.find(({ id }) => id === fight.event) ?? null}
              problems={problems}
              onChange={mayChange ? () => setOpened({ fight: fight.id }) : null}
            />
          ),
        )}
        {fights.data?.length === 0 && !mayChange && (
          <p className="py-5 font-report text-report text-ink-3 italic">No fight is set yet.</p>
        )}
        {mayChange &&
          (opened && 'fight' in opened && opened.fight === null ? (
            <FightForm team={team} fight={null} events={known} problems={problems} onDone={close} />
          ) : (
            <p className="py-4">
              <Word onClick={() => setOpened({ fight: null })}>Add a fight</Word>
            </p>
          ))}
      </section>
      <h2 className="mt-10 mb-3 font-report text-xl font-medium">Events</h2>
      <section aria-label="Events" className="page-sheet divide-y divide-hair px-5 sm:px-7">
        {known.map((event) =>
          opened && 'event' in opened && opened.event === event.id ? (
            <EventForm key={event.id} team={team.slug} kept={event} start={event} onDone={close} />
          ) : (
            <EventRow
              key={event.id}
              event={event}
              onChange={mayChange ? () => setOpened({ event: event.id }) : null}
            />
          ),
        )}
        {known.length === 0 && !mayChange && (
          <p className="py-5 font-report text-report text-ink-3 italic">No event is entered yet.</p>
        )}
        {mayChange &&
          (opened && 'start' in opened ? (
            <EventForm
              key={opened.start.name}
              team={team.slug}
              kept={null}
              start={opened.start}
              onDone={close}
            />
          ) : (
            <p className="flex flex-wrap gap-x-5 gap-y-2 py-4">
              {EXAMPLE_EVENTS.map((example) => (
                <Word key={example.name} onClick={() => setOpened({ start: example })}>
                  Begin from “{example.name}”
                </Word>
              ))}
            </p>
          ))}
      </section>
      {team.isDemo && (
        <p className="mt-4 text-xs text-ink-3">The fights and the events are invented for demonstration.</p>
      )}
    </main>
  );
}
