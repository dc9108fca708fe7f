import { useQuery } from '@tanstack/react-query';
import { useParams } from 'react-router-dom';
import { Loading } from '#src/components/loading.tsx';
import { copyQuery } from '#src/features/copy/api/open-copy.ts';
import { standingQuery } from '#src/features/copy/api/get-standing.ts';
import { ClosedPage } from '#src/features/copy/bar/closed-page.tsx';
import { PassphrasePage } from '#src/features/copy/bar/passphrase-page.tsx';
import { ApiError } from '#src/lib/api/api-error.ts';
import { FailedScreen } from './failed-screen.tsx';
import { OpenCopyPage } from './open-copy-page.tsx';
import '#src/features/copy/copy.css';

/** A lent copy, for whoever holds its address; no account is needed. */
export function Component() {
  const { token = '' } = useParams();
  const { data: copy, error, refetch } = useQuery(copyQuery(token));
  const standing = useQuery({ ...standingQuery(token), enabled: copy !== undefined });
  if (standing.data === null) return <ClosedPage token={token} wasOpen />;
  if (copy) return <OpenCopyPage copy={copy} token={token} />;
  if (error instanceof ApiError && error.status === 404) return <ClosedPage token={token} wasOpen={false} />;
  if (error instanceof ApiError && error.code === 'passphrase-needed')
    return <PassphrasePage token={token} />;
  if (error) return <FailedScreen error={error} onAgain={() => void refetch()} />;
  return <Loading what="the copy" />;
}
