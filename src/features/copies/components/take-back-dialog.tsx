import type { Copy } from '#shared/contracts/copies.ts';
import { Button } from '#src/components/button.tsx';
import { Dialog } from '#src/components/dialog.tsx';
import { Notice } from '#src/components/notice.tsx';
import { sentenceOf } from '#src/lib/api/api-error.ts';
import { say } from '#src/lib/sill-store.ts';
import { useChangeCopy } from '../api/change-copies.ts';

interface TakeBackDialogProps {
  readonly team: string;
  readonly copy: Copy;
  readonly onClose: () => void;
}

/** Ends a copy before its time. */
export function TakeBackDialog({ team, copy, onClose }: TakeBackDialogProps) {
  const { mutate, isPending, error } = useChangeCopy(team);
  const { recipient, problem, edition, views, number, id } = copy;
  const takeBack = () =>
    mutate(
      { number: problem.number, id, takenBack: true },
      {
        onSuccess: () => {
          say(`Copy ${number} is taken back from ${recipient}.`);
          onClose();
        },
      },
    );
  return (
    <Dialog
      open
      onClose={onClose}
      title={`Take back the copy of ${problem.title} from ${recipient}?`}
      sentence={`Edition ${edition.n} ${views.opened === 0 ? 'has not been opened yet' : `has been opened ${views.opened === 1 ? 'once' : `${views.opened} times`}`}. Its address opens nothing from now on, and a screen that has it open closes it. What was read stays read, and the questions they noted stay theirs.`}
      actions={
        <>
          <Button kind="plain" onClick={onClose}>
            Leave it open
          </Button>
          <Button kind="risk" busy={isPending} onClick={takeBack}>
            Take back
          </Button>
        </>
      }
    >
      {error && <Notice title={sentenceOf(error)} />}
    </Dialog>
  );
}
