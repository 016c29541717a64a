import { Button } from '@/components/ui/button';
import { LinkButton } from '@/components/ui/link-button';
import { Progress } from '@/components/ui/progress';
import { Refusal } from '@/components/ui/refusal';
import type { PreviewState } from './use-preview';

interface LookingProps {
  state: Exclude<PreviewState, { kind: 'ready' }>;
  toNumber: number;
  stop: () => void;
  again: () => void;
}

/** The preview on its way, stopped, or failed. */
export function Looking({ state, toNumber, stop, again }: LookingProps) {
  if (state.kind === 'running') {
    return (
      <Progress
        className="max-w-[40rem]"
        label={`pricing what is recorded by version ${toNumber}`}
        value={state.of === null ? null : state.done}
        max={state.of ?? 0}
        text={state.of === null ? undefined : `${state.done} of ${state.of} attempts`}
        cancel={<Button onClick={stop}>cancel</Button>}
      />
    );
  }
  const look = (
    <Button kind="act" onClick={again}>
      look again
    </Button>
  );
  if (state.kind === 'stopped') {
    return (
      <div className="grid justify-items-start gap-3">
        <p>You stopped the preview. Nothing was changed.</p>
        {look}
      </div>
    );
  }
  return (
    <Refusal
      title={state.message}
      action={state.signedOut ? <LinkButton href="/sign-in">sign in</LinkButton> : look}
    >
      Nothing was changed: a preview only reads.
    </Refusal>
  );
}
