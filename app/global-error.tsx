'use client';

import { OutOfOrder } from './_components/out-of-order';
import './globals.css';

/** Stands in when even the frame of all pages could not be made. */
export default function GlobalError({ error }: { error: Error & { digest?: string } }) {
  return (
    <html lang="en" data-theme="auto">
      <body>
        <title>Trymark</title>
        <OutOfOrder reference={error.digest} onRetry={() => window.location.reload()} />
      </body>
    </html>
  );
}
