import clsx from 'clsx';
import { type ComponentProps, type ReactNode, useId } from 'react';
import { describedBy, FIELD_CLASS, FieldFrame } from './FieldFrame.tsx';

export interface TextAreaProps extends ComponentProps<'textarea'> {
  label: string;
  hint?: ReactNode;
  error?: string;
  /** Classes of the field itself; `className` goes to the frame around it. */
  fieldClassName?: string;
}

/** Text of several lines, with its label, hint and error. */
export function TextArea({ label, hint, error, className, fieldClassName, id, ...rest }: TextAreaProps) {
  const own = useId();
  const fieldId = id ?? own;
  return (
    <FieldFrame id={fieldId} label={label} hint={hint} error={error} className={className}>
      <textarea
        rows={3}
        {...rest}
        id={fieldId}
        aria-invalid={error ? true : undefined}
        aria-describedby={describedBy(fieldId, hint, error)}
        className={clsx(FIELD_CLASS, fieldClassName)}
      />
    </FieldFrame>
  );
}
