import { LinkButton } from '@/components/ui/link-button';
import { Refusal } from '@/components/ui/refusal';

/** A link that cannot be used: why, and what to do. */
export function LinkEnded({ message, askAgain = false }: { message: string; askAgain?: boolean }) {
  return (
    <Refusal
      title="This link cannot be used"
      action={
        <span className="flex flex-wrap gap-2">
          {askAgain ? (
            <LinkButton kind="act" href="/reset">
              ask for another
            </LinkButton>
          ) : null}
          <LinkButton href="/sign-in">to sign-in</LinkButton>
        </span>
      }
    >
      <p>{message}</p>
    </Refusal>
  );
}
