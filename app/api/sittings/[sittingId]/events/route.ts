import { currentActor } from '@/lib/auth/session';
import { keepEvents } from '@/lib/data/rounds/keep-events';
import { type Problem, problem } from '@/lib/result';
import { PROTOCOL_VERSION } from '@/lib/sync/protocol';
import { answer, answerProblem, route } from '@/lib/transport/route';
import { readSameOriginJson } from '@/lib/transport/same-origin';

const OTHER_VERSION: Problem = {
  code: 'stale',
  message:
    'This page is of another version than the server. Nothing was lost: reload the page, and it sends on.',
};

/** Takes a batch of events; the answer names each as kept, already there, or refused with its reason. */
export const POST = route(
  async (request: Request, { params }: RouteContext<'/api/sittings/[sittingId]/events'>) => {
    const body = await readSameOriginJson(request);
    if (!body.ok) return answerProblem(body.problem);
    const actor = await currentActor();
    if (!actor)
      return answer(problem('unauthenticated', 'Sign in to go on. What you recorded stays on this device.'));
    if (!speaksThisVersion(body.value)) return answerProblem(OTHER_VERSION);
    return answer(await keepEvents(actor, { sittingId: (await params).sittingId, push: body.value }));
  },
);

function speaksThisVersion(value: unknown): boolean {
  return (
    typeof value === 'object' && value !== null && 'protocol' in value && value.protocol === PROTOCOL_VERSION
  );
}
