import 'server-only';
import { headers } from 'next/headers';

/** The address that the request came from, as the nearest proxy (or the server itself) wrote it down last. */
export async function clientAddress(): Promise<string> {
  const forwarded = (await headers()).get('x-forwarded-for') ?? '';
  return forwarded.split(',').at(-1)?.trim().slice(0, 64) || 'unknown';
}
