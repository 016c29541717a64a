import { currentActor } from '@/lib/auth/session';
import { readGradebook } from '@/lib/data/gradebook/read-gradebook';
import { answer } from '@/lib/transport/route';

/** A section's gradebook, as the page asks for it again and again while a round goes on. */
export async function GET(
  _request: Request,
  { params }: RouteContext<'/api/gradebook/[sectionId]'>,
): Promise<Response> {
  return answer(await readGradebook(await currentActor(), { sectionId: (await params).sectionId }));
}
