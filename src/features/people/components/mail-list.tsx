import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import type { MailEntry } from '#shared/contracts/people.ts';
import { Notice } from '#src/components/notice.tsx';
import { Word } from '#src/components/word.tsx';
import { sentenceOf } from '#src/lib/api/api-error.ts';
import { outboxQuery, usePeopleActions } from '../api/people.ts';
import { mailWords } from '../sentences/people-words.ts';

/** The mail that the team caused, and where each is on its way. */
export function MailList({ team }: { readonly team: string }) {
  const { data, error, refetch } = useQuery(outboxQuery(team));
  const { retry } = usePeopleActions(team);
  const [now] = useState(() => new Date());
  if (error) {
    return (
      <Notice title="The mail could not be brought." className="my-3">
        {sentenceOf(error)} <Word onClick={() => void refetch()}>Try again</Word>
      </Notice>
    );
  }
  if (!data) return <p className="py-4 text-sm text-ink-2">Looking for the mail.</p>;
  if (data.length === 0) {
    return (
      <p className="py-4 font-report text-[17px]/6 text-ink-3 italic">
        The team has caused no mail yet. An invitation is the first.
      </p>
    );
  }
  return (
    <>
      {retry.error && <Notice title={sentenceOf(retry.error)} className="my-3" />}
      <ul>
        {data.map((mail) => (
          <MailRow key={mail.id} mail={mail} now={now} onRetry={() => retry.mutate(mail.id)} />
        ))}
      </ul>
    </>
  );
}

interface MailRowProps {
  readonly mail: MailEntry;
  readonly now: Date;
  readonly onRetry: () => void;
}

function MailRow({ mail, now, onRetry }: MailRowProps) {
  return (
    <li className="border-b border-hair py-3">
      <div className="flex flex-wrap items-baseline gap-x-6 gap-y-1">
        <b className="font-report text-[17px]/6 font-medium">{mail.subject}</b>
        <span className="min-w-0 flex-1 basis-64 text-sm break-words text-ink-2">
          to {mail.to.name}, {mail.to.address}; {mailWords(mail, now)}
        </span>
        {mail.mayRetry && mail.error !== null && (
          <Word onClick={onRetry}>
            Send again<span className="sr-only"> to {mail.to.name}</span>
          </Word>
        )}
      </div>
      <details className="mt-1 text-sm">
        <summary className="inline-block min-h-6 cursor-pointer text-ink-2">
          What it says<span className="sr-only"> to {mail.to.name}</span>
        </summary>
        <p className="mt-2 max-w-[680px] font-report text-[16px]/6 break-words whitespace-pre-line">
          {mail.text}
        </p>
      </details>
    </li>
  );
}
