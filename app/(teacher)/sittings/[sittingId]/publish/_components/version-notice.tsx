import { Notice } from '@/components/ui/notice';
import { count } from '../../../../_components/names';
import type { VersionSince } from './version-since';

/** Says that the version is another than that of the latest publication, and what that alone changes. */
export function VersionNotice({ since: { publication, from, to, held, changed } }: { since: VersionSince }) {
  return (
    <Notice
      className="mb-8"
      title={`The version changed since publication ${publication}: from ${from} to ${to}${held ? ', nobody drops' : ''}.`}
    >
      {changed === 0
        ? 'By itself that changes no score that is out.'
        : `By itself that changes ${count(changed, 'score', 'scores')} of those that are out; whoever has one of them is told.`}
    </Notice>
  );
}
