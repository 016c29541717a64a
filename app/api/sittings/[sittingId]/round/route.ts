import { currentActor } from '@/lib/auth/session';
import { readRound } from '@/lib/data/rounds/read-round';
import { answer } from '@/lib/transport/route';

/** Everything a device stores to walk the round, with or without a network. */
export async function GET(
  _request: Request,
  { params }: RouteContext<'/api/sittings/[sittingId]/round'>,
): Promise<Response> {
  return answer(await readRound(await currentActor(), { sittingId: (await params).sittingId }));
}
