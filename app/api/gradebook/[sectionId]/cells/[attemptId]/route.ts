import { currentActor } from '@/lib/auth/session';
import { explainCell } from '@/lib/data/gradebook/explain-cell';
import { answer, route } from '@/lib/transport/route';

/** Where the points of one cell of the gradebook went. */
export const GET = route(
  async (_request: Request, { params }: RouteContext<'/api/gradebook/[sectionId]/cells/[attemptId]'>) => {
    const { sectionId, attemptId } = await params;
    return answer(await explainCell(await currentActor(), { sectionId, attemptId }));
  },
);
