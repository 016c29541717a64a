import { Cell, HeadCell, RowHead, Table, TableBody, TableHead } from '@/components/table/table';
import { sayMoment } from '@/components/ui/days';
import type { GradebookView } from '@/lib/contracts/gradebook';

interface FilesSentProps {
  files: GradebookView['files'];
  timeZone: string;
}

/** The last files that went out; each can be sent again, byte for byte. */
export function FilesSent({ files, timeZone }: FilesSentProps) {
  if (files.length === 0) return <p className="text-label">No file has been sent from here yet.</p>;
  return (
    <Table caption="files sent" showCaption>
      <TableHead>
        <tr>
          <HeadCell>file</HeadCell>
          <HeadCell>sent</HeadCell>
          <HeadCell align="right">rows</HeadCell>
          <HeadCell>
            <span className="sr-only">again</span>
          </HeadCell>
        </tr>
      </TableHead>
      <TableBody>
        {files.map((file) => (
          <FileRow key={file.fileId} file={file} timeZone={timeZone} />
        ))}
      </TableBody>
    </Table>
  );
}

function FileRow({ file, timeZone }: { file: GradebookView['files'][number]; timeZone: string }) {
  return (
    <tr>
      <RowHead className="break-all">
        {file.fileName}
        <span className="block text-small font-[480] text-ink-2" title={`SHA-256 ${file.sha256}`}>
          {file.bytes} bytes, {file.sha256.slice(0, 8)}
        </span>
      </RowHead>
      <Cell>
        {sayMoment(file.sentAt, timeZone)}
        <span className="block text-small text-ink-2">by {file.sentBy}</span>
      </Cell>
      <Cell align="right">{file.rows}</Cell>
      <Cell align="right">
        <a
          className="link"
          href={`/api/exports/files/${file.fileId}`}
          download
          aria-label={`send ${file.fileName} again`}
        >
          again
        </a>
      </Cell>
    </tr>
  );
}
