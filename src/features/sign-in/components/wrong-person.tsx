import { Button } from '#src/components/button.tsx';
import { Notice } from '#src/components/notice.tsx';
import { useSignOut } from '#src/features/sign-in/api/sign-out.ts';

/** An invitation opened in a browser where somebody else is at work. */
export function WrongPerson({ signedIn, invited }: { signedIn: string; invited: string }) {
  const signOut = useSignOut({ stay: true });
  return (
    <Notice
      title={`You are signed in as ${signedIn}`}
      actions={
        <Button variant="act" busy={signOut.isPending} onClick={() => signOut.mutate()}>
          Sign out and go on as {invited}
        </Button>
      }
    >
      This invitation is for {invited}. Sign out first, or open the link on their own device.
    </Notice>
  );
}
