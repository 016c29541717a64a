import { classNames } from './class-names';
import { TextField, type TextFieldProps } from './text-field';

/** A number typed as text: no spinner, no scroll wheel, digits that stand under each other. */
export function NumberField({ inputClassName, ...props }: TextFieldProps) {
  return (
    <TextField
      inputMode="decimal"
      autoComplete="off"
      {...props}
      inputClassName={classNames('tnum', inputClassName)}
    />
  );
}
