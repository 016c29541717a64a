import { currentActor } from '@/lib/auth/session';
import { exportPractical } from '@/lib/data/practicals/export-practical';
import { answerProblem, route } from '@/lib/transport/route';

/** A practical with its rubric as one file: a version by its number, else the draft. */
export const GET = route(
  async (request: Request, { params }: RouteContext<'/api/practicals/[practicalId]/file'>) => {
    const { practicalId } = await params;
    const asked = new URL(request.url).searchParams.get('version');
    const version = asked === null ? null : Number(asked);
    const result = await exportPractical(await currentActor(), { practicalId, version });
    if (!result.ok) return answerProblem(result.problem);
    return new Response(result.value.text, {
      headers: {
        'content-type': 'application/json; charset=utf-8',
        'content-disposition': `attachment; filename="${result.value.fileName}"`,
        'cache-control': 'private, no-store',
        'x-content-type-options': 'nosniff',
      },
    });
  },
);
