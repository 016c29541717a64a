import type { PersonState } from '@/lib/data/school/person-view';

/** How far a person has come, as the list says it. */
export const STATE_WORDS: Record<PersonState, string> = {
  active: '',
  invited: 'invited, not in yet',
  'invitation ended': 'invitation has ended',
  'no passphrase': 'no passphrase yet',
  left: 'has left',
};
