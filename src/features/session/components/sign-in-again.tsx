import { Button } from '#src/components/button.tsx';
import { Dialog } from '#src/components/dialog.tsx';
import { settleSignInAgain, type EndedSession } from '#src/lib/session/sign-in-again.ts';
import { CredentialsForm } from './credentials-form.tsx';

/** Over the work that is open, which stays as it is: nothing typed is lost. */
export function SignInAgain({ ended }: { readonly ended: EndedSession }) {
  const close = () => settleSignInAgain(false);
  const signedIn = (userId: string) => {
    settleSignInAgain(userId === ended.userId);
    // What is open belongs to somebody else.
    if (userId !== ended.userId) location.assign('/');
  };
  return (
    <Dialog
      open
      onClose={close}
      title={`Are you still ${ended.name}?`}
      sentence="You have been signed out, because the session ended or was ended elsewhere. What you typed is still here; sign in and it is kept."
      actions={null}
    >
      <CredentialsForm
        email={ended.email}
        onSignedIn={signedIn}
        beside={
          <Button kind="plain" onClick={close}>
            Not now
          </Button>
        }
      />
    </Dialog>
  );
}
