import { answerFile } from '@/app/api/exports/answer-file';
import { currentActor } from '@/lib/auth/session';
import { sendAgain } from '@/lib/data/gradebook/send-again';
import { route } from '@/lib/transport/route';

/** A file that was sent before, byte for byte. */
export const GET = route(
  async (_request: Request, { params }: RouteContext<'/api/exports/files/[fileId]'>) => {
    return answerFile(await sendAgain(await currentActor(), { fileId: (await params).fileId }));
  },
);
