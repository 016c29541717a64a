import { type ButtonKind, buttonClass } from '@/components/ui/button-style';

interface FileLinkProps {
  practicalId: string;
  /** Null: the draft. */
  version: number | null;
  kind?: ButtonKind;
  small?: boolean;
}

/** Takes a practical out as a file. */
export function FileLink({ practicalId, version, kind = 'plain', small = false }: FileLinkProps) {
  const query = version === null ? '' : `?version=${version}`;
  return (
    <a
      className={buttonClass({ kind, size: small ? 'small' : 'desk' })}
      href={`/api/practicals/${practicalId}/file${query}`}
      aria-label={version === null ? 'take the draft out as a file' : `take version ${version} out as a file`}
      download
    >
      as a file
    </a>
  );
}
