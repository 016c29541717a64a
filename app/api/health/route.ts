import { checkDatabase } from '@/lib/data/health/check-database';

export const dynamic = 'force-dynamic';

export async function GET(): Promise<Response> {
  const up = await checkDatabase();
  return Response.json(
    { database: up ? 'up' : 'down' },
    { status: up ? 200 : 503, headers: { 'cache-control': 'no-store' } },
  );
}
