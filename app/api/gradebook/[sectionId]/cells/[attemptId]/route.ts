import { currentActor } from '@/lib/auth/session';
import { explainCell } from '@/lib/data/gradebook/explain-cell';
import { answer } from '@/lib/transport/route';

/** Where the points of one cell of the gradebook went. */
export async function GET(
  _request: Request,
  { params }: RouteContext<'/api/gradebook/[sectionId]/cells/[attemptId]'>,
): Promise<Response> {
  const { sectionId, attemptId } = await params;
  return answer(await explainCell(await currentActor(), { sectionId, attemptId }));
}
