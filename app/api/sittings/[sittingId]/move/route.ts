import { currentActor } from '@/lib/auth/session';
import type { PreviewLine } from '@/lib/contracts/moves';
import { previewMove } from '@/lib/data/sittings/preview-move';
import { answerLines } from '@/lib/transport/lines';
import { route } from '@/lib/transport/route';

/** What moving the sitting to `version` would do, in lines of JSON: how far it has come, and the preview as the last. */
export const GET = route(
  async (request: Request, { params }: RouteContext<'/api/sittings/[sittingId]/move'>) => {
    const actor = await currentActor();
    const { sittingId } = await params;
    const versionId = new URL(request.url).searchParams.get('version');
    return answerLines<PreviewLine>(request.signal, async (write, signal) => {
      const onProgress = (done: number, of: number) => write({ kind: 'progress', done, of });
      const previewed = await previewMove(actor, { sittingId, versionId }, { signal, onProgress });
      if (!previewed.ok) return previewed.problem;
      write({ kind: 'preview', preview: previewed.value });
      return null;
    });
  },
);
