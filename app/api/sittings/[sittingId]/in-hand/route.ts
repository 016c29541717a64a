import { currentActor } from '@/lib/auth/session';
import { readInHand } from '@/lib/data/rounds/read-in-hand';
import { takeInHand } from '@/lib/data/rounds/take-in-hand';
import { answer, answerProblem, route } from '@/lib/transport/route';
import { readSameOriginJson } from '@/lib/transport/same-origin';

type Context = RouteContext<'/api/sittings/[sittingId]/in-hand'>;

/** Whose pieces the other devices have in hand. */
export const GET = route(async (request: Request, { params }: Context) => {
  const deviceId = new URL(request.url).searchParams.get('device');
  return answer(await readInHand(await currentActor(), { sittingId: (await params).sittingId, deviceId }));
});

/** Says whose pieces this device has in hand; the answer is the same as GET's. */
export const POST = route(async (request: Request, { params }: Context) => {
  const body = await readSameOriginJson(request);
  if (!body.ok) return answerProblem(body.problem);
  const given = typeof body.value === 'object' && body.value !== null ? body.value : {};
  return answer(await takeInHand(await currentActor(), { ...given, sittingId: (await params).sittingId }));
});
