import clsx from 'clsx';
import { type ComponentProps, type ReactNode, useId } from 'react';
import { describedBy, FIELD_CLASS, FieldFrame } from './FieldFrame.tsx';

export interface TextFieldProps extends ComponentProps<'input'> {
  label: string;
  hint?: ReactNode;
  error?: string;
  /** Classes of the field itself; `className` goes to the frame around it. */
  fieldClassName?: string;
}

/** Text of one line, with its label, hint and error. */
export function TextField({ label, hint, error, className, fieldClassName, id, ...rest }: TextFieldProps) {
  const own = useId();
  const fieldId = id ?? own;
  return (
    <FieldFrame id={fieldId} label={label} hint={hint} error={error} className={className}>
      <input
        {...rest}
        id={fieldId}
        aria-invalid={error ? true : undefined}
        aria-describedby={describedBy(fieldId, hint, error)}
        className={clsx(FIELD_CLASS, fieldClassName)}
      />
    </FieldFrame>
  );
}
