import { type ComponentProps, type ReactNode, useId } from 'react';
import { classNames } from './class-names';
import { describeField, type FieldNotes } from './field';

interface ChoiceProps extends Omit<ComponentProps<'input'>, 'type'>, FieldNotes {
  label: ReactNode;
}

const BOX =
  'mt-0.5 size-6 shrink-0 cursor-pointer appearance-none border-outline border-ink bg-plate checked:bg-act checked:border-act disabled:border-dashed disabled:border-rule';

function Choice({ type, label, hint, error, finding, className, ...input }: ChoiceProps & { type: string }) {
  const made = useId();
  const id = input.id ?? made;
  const notes = { hint, error, finding };
  const errors = Array.isArray(error) ? error.join(' ') : error;
  return (
    <div className={classNames('flex min-h-11 items-start gap-3 py-2', className)}>
      <input
        {...input}
        {...describeField(id, notes)}
        type={type}
        className={classNames(BOX, type === 'radio' ? 'choice-radio rounded-[50%]' : 'choice-check')}
      />
      <div className="min-w-0">
        <label htmlFor={id} className="cursor-pointer text-text leading-7">
          {label}
        </label>
        {finding ? <div id={`${id}-finding`}>{finding}</div> : null}
        {errors ? (
          <p id={`${id}-error`} className="text-label font-[580] text-refuse">
            {errors}
          </p>
        ) : null}
        {hint ? (
          <div id={`${id}-hint`} className="text-label text-ink-2">
            {hint}
          </div>
        ) : null}
      </div>
    </div>
  );
}

export function CheckboxField(props: ChoiceProps) {
  return <Choice {...props} type="checkbox" />;
}

export function RadioField(props: ChoiceProps) {
  return <Choice {...props} type="radio" />;
}

interface ChoiceGroupProps {
  legend: ReactNode;
  error?: string | null;
  children: ReactNode;
  className?: string;
}

/** Several choices under one question. */
export function ChoiceGroup({ legend, error, children, className }: ChoiceGroupProps) {
  const id = useId();
  return (
    <fieldset className={classNames('min-w-0', className)} aria-describedby={error ? id : undefined}>
      <legend className="text-label text-ink-2">{legend}</legend>
      {children}
      {error ? (
        <p id={id} className="text-label font-[580] text-refuse">
          {error}
        </p>
      ) : null}
    </fieldset>
  );
}
