import { answerFile } from '@/app/api/exports/answer-file';
import { currentActor } from '@/lib/auth/session';
import { exportGrades } from '@/lib/data/gradebook/export-files';

/** The published grades of a section as a file; of one sitting where `?sitting=` names it. */
export async function GET(
  request: Request,
  { params }: RouteContext<'/api/exports/[sectionId]/grades.csv'>,
): Promise<Response> {
  const sittingId = new URL(request.url).searchParams.get('sitting');
  const { sectionId } = await params;
  return answerFile(await exportGrades(await currentActor(), { sectionId, sittingId }));
}
