'use client';

import { useState } from 'react';
import { useBench } from './bench-context';

const LARGEST_FILE = 20_000_000;

/** Saving the unsent readings of this tablet as a file, and taking such a file in. */
export function useUnsentFile() {
  const { session } = useBench();
  const [told, setTold] = useState('');

  async function save() {
    const text = await session.unsentFile();
    if (text === null) return;
    const link = document.createElement('a');
    link.href = URL.createObjectURL(new Blob([text], { type: 'application/json' }));
    link.download = `unsent readings ${new Date().toISOString().slice(0, 16).replace(':', '')}.json`;
    link.click();
    URL.revokeObjectURL(link.href);
    setTold('Saved. The readings stay on this tablet as well.');
  }

  async function takeIn(file: File) {
    if (file.size > LARGEST_FILE) return setTold('This file is too large to be one of unsent readings.');
    const result = await session.takeUnsentFile(await file.text());
    if (!result.ok) return setTold(result.reason);
    const { taken, known, others } = result;
    setTold(
      `${taken} taken in, ${known} were known.${others > 0 ? ` ${others} were made by somebody else and wait until that person signs in here.` : ''}`,
    );
  }

  return { save, takeIn, told };
}
