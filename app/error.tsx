'use client';

import { useRouter } from 'next/navigation';
import { startTransition } from 'react';
import { OutOfOrder } from './_components/out-of-order';

interface ErrorPageProps {
  error: Error & { digest?: string };
  reset: () => void;
}

export default function ErrorPage({ error, reset }: ErrorPageProps) {
  const router = useRouter();
  const retry = () =>
    startTransition(() => {
      router.refresh();
      reset();
    });
  return <OutOfOrder reference={error.digest} onRetry={retry} />;
}
