import { currentActor } from '@/lib/auth/session';
import { readRound } from '@/lib/data/rounds/read-round';
import { answer, route } from '@/lib/transport/route';

/** Everything a device stores to walk the round, with or without a network. */
export const GET = route(
  async (_request: Request, { params }: RouteContext<'/api/sittings/[sittingId]/round'>) => {
    return answer(await readRound(await currentActor(), { sittingId: (await params).sittingId }));
  },
);
