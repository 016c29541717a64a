import 'server-only';
import { env } from '@/lib/env';
import { openStore, type Store } from './store';

let opened: Store | null | undefined;

/** Where files that went out are kept; null when this installation has no bucket. */
export function store(): Store | null {
  if (opened === undefined) opened = openStore(env());
  return opened;
}
