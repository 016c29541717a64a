import { currentActor } from '@/lib/auth/session';
import { readGradebook } from '@/lib/data/gradebook/read-gradebook';
import { answer, route } from '@/lib/transport/route';

/** A section's gradebook, as the page asks for it again and again while a round goes on. */
export const GET = route(
  async (_request: Request, { params }: RouteContext<'/api/gradebook/[sectionId]'>) => {
    return answer(await readGradebook(await currentActor(), { sectionId: (await params).sectionId }));
  },
);
