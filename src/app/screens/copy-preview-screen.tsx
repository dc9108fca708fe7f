import { useQuery } from '@tanstack/react-query';
import { useCallback } from 'react';
import { useParams } from 'react-router-dom';
import { getFile } from '#shared/contracts/report.ts';
import { Loading } from '#src/components/loading.tsx';
import { previewQuery } from '#src/features/copies/api/preview-copy.ts';
import { addressOf } from '#src/lib/api/address-of.ts';
import { useTeam } from '#src/lib/team/team-context.ts';
import { FailedScreen } from './failed-screen.tsx';
import { OpenCopyPage } from './open-copy-page.tsx';
import '#src/features/copy/copy.css';

/** What the reader of a copy sees, for the captain who lent it. */
export function Component() {
  const { problem = '', copy: id = '' } = useParams();
  const { team } = useTeam();
  const address = { team: team.slug, number: Number(problem) };
  const { data, error, refetch } = useQuery(previewQuery(address, id));
  const addressOfPicture = useCallback(
    (sha: string) => addressOf(getFile.path, { team: team.slug, number: problem, sha }),
    [team.slug, problem],
  );
  if (data) return <OpenCopyPage copy={data} token={null} addressOfPicture={addressOfPicture} />;
  if (error) return <FailedScreen error={error} onAgain={() => void refetch()} />;
  return <Loading what="the copy" />;
}
