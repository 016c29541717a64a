import 'server-only';
import { linkInput } from '@/lib/contracts/account';
import { defineEntry } from './entry';
import { openLink, openSetupLink } from './open-link';

export interface LinkView {
  givenName: string;
  familyName: string;
  email: string | null;
  schoolName: string;
}

/** Whom an invitation is for. Looking uses nothing up: mail programs open links by themselves. */
export const readInvitation = defineEntry({
  input: linkInput,
  run: async ({ input, db }): Promise<LinkView> =>
    view(await openLink(db, 'invitation', input.secret, false)),
});

/** Whose password a reset link is for; looking uses nothing up. */
export const readResetLink = defineEntry({
  input: linkInput,
  run: async ({ input, db }): Promise<LinkView> => view(await openLink(db, 'reset', input.secret, false)),
});

/** Whether a set-up link can be used; looking uses nothing up. */
export const readSetupLink = defineEntry({
  input: linkInput,
  run: async ({ input, db }): Promise<null> => {
    await openSetupLink(db, input.secret, false);
    return null;
  },
});

function view({ givenName, familyName, email, schoolName }: LinkView): LinkView {
  return { givenName, familyName, email, schoolName };
}
