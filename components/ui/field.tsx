import type { ReactNode } from 'react';
import { classNames } from './class-names';

export interface FieldNotes {
  hint?: ReactNode;
  /** The refusal, as the server or the form said it; several are shown one below the other. */
  error?: string | string[] | null;
  /** A finding: worth seeing, not a refusal. */
  finding?: ReactNode;
}

interface FieldProps extends FieldNotes {
  id: string;
  label: ReactNode;
  hideLabel?: boolean;
  optional?: boolean;
  children: ReactNode;
  className?: string;
}

function errorList(error: FieldNotes['error']): string[] {
  if (!error) return [];
  return Array.isArray(error) ? error : [error];
}

/** The attributes that tie a control to its hint, finding and refusal. */
export function describeField(id: string, notes: FieldNotes) {
  const refused = errorList(notes.error).length > 0;
  const ids = [
    refused ? `${id}-error` : null,
    notes.finding ? `${id}-finding` : null,
    notes.hint ? `${id}-hint` : null,
  ].filter((each) => each !== null);
  return {
    id,
    'aria-invalid': refused || undefined,
    'aria-describedby': ids.length > 0 ? ids.join(' ') : undefined,
  };
}

/** The look of a control: a line to write on, heavy blue in hand, red when refused. */
export function controlClass(notes: FieldNotes, className?: string): string {
  const refused = errorList(notes.error).length > 0;
  return classNames(
    'block min-h-11 w-full min-w-0 border-0 border-b border-rule bg-plate px-3 py-2 text-lead text-ink',
    'hover:border-ink focus:border-b-edge focus:border-act focus:pb-[6px]',
    'disabled:border-dashed disabled:bg-transparent disabled:text-ink-2',
    notes.finding && !refused && 'border-b-edge border-ink pb-[6px]',
    refused && 'border-b-outline border-refuse bg-refuse-wash',
    className,
  );
}

export function Field({
  id,
  label,
  hideLabel,
  optional,
  hint,
  error,
  finding,
  children,
  className,
}: FieldProps) {
  const errors = errorList(error);
  return (
    <div className={classNames('min-w-0', className)}>
      <label htmlFor={id} className={hideLabel ? 'sr-only' : 'mb-1 block text-label text-ink-2'}>
        {label}
        {optional ? <span> (may be left empty)</span> : null}
      </label>
      {children}
      {finding ? (
        <div id={`${id}-finding`} className="relative mt-1 pl-6 text-label font-[520]">
          <span aria-hidden className="absolute -top-1.5 left-2 h-4 w-3 border-b border-l border-ink" />
          <span aria-hidden className="absolute -top-2 left-[5px] size-[7px] rounded-[50%] bg-ink" />
          {finding}
        </div>
      ) : null}
      {errors.length > 0 ? (
        <div id={`${id}-error`} className="mt-1 text-label font-[580] text-refuse">
          {errors.map((each) => (
            <p key={each}>{each}</p>
          ))}
        </div>
      ) : null}
      {hint ? (
        <div id={`${id}-hint`} className="mt-1 text-label text-ink-2">
          {hint}
        </div>
      ) : null}
    </div>
  );
}
