import { answerFile } from '@/app/api/exports/answer-file';
import { currentActor } from '@/lib/auth/session';
import { exportSizes } from '@/lib/data/gradebook/export-files';
import { route } from '@/lib/transport/route';

/** The published sizes of a section as a file; of one sitting where `?sitting=` names it. */
export const GET = route(
  async (request: Request, { params }: RouteContext<'/api/exports/[sectionId]/sizes.csv'>) => {
    const sittingId = new URL(request.url).searchParams.get('sitting');
    const { sectionId } = await params;
    return answerFile(await exportSizes(await currentActor(), { sectionId, sittingId }));
  },
);
