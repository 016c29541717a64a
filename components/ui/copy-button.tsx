'use client';

import { useEffect, useState } from 'react';
import { Button, type ButtonProps } from './button';

interface CopyButtonProps extends Omit<ButtonProps, 'onClick'> {
  text: string;
  label?: string;
}

export function CopyButton({ text, label = 'copy', ...props }: CopyButtonProps) {
  const [state, setState] = useState<'ready' | 'copied' | 'refused'>('ready');
  useEffect(() => {
    if (state === 'ready') return;
    const timer = setTimeout(() => setState('ready'), 2500);
    return () => clearTimeout(timer);
  }, [state]);

  function copy() {
    navigator.clipboard.writeText(text).then(
      () => setState('copied'),
      () => setState('refused'),
    );
  }

  const words = { ready: label, copied: 'copied', refused: 'select it and copy by hand' };
  return (
    <Button {...props} onClick={copy}>
      <span aria-live="polite">{words[state]}</span>
    </Button>
  );
}
