import type { FormEvent } from 'react';

/** React empties a form once its action has answered; a refused form must keep all that was typed. */
export function keepTyped(event: FormEvent<HTMLFormElement>): void {
  event.preventDefault();
}
