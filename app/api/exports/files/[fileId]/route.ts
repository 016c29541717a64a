import { answerFile } from '@/app/api/exports/answer-file';
import { currentActor } from '@/lib/auth/session';
import { sendAgain } from '@/lib/data/gradebook/send-again';

/** A file that was sent before, byte for byte. */
export async function GET(
  _request: Request,
  { params }: RouteContext<'/api/exports/files/[fileId]'>,
): Promise<Response> {
  return answerFile(await sendAgain(await currentActor(), { fileId: (await params).fileId }));
}
