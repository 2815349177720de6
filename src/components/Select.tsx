import clsx from 'clsx';
import { type ComponentProps, type ReactNode, useId } from 'react';
import { describedBy, FIELD_CLASS, FieldFrame } from './FieldFrame.tsx';

export interface SelectProps extends ComponentProps<'select'> {
  label: string;
  hint?: ReactNode;
  error?: string;
  /** Classes of the field itself; `className` goes to the frame around it. */
  fieldClassName?: string;
}

/** A choice from a list, with its label, hint and error. */
export function Select({ label, hint, error, className, fieldClassName, id, ...rest }: SelectProps) {
  const own = useId();
  const fieldId = id ?? own;
  return (
    <FieldFrame id={fieldId} label={label} hint={hint} error={error} className={className}>
      <div className="relative">
        <select
          {...rest}
          id={fieldId}
          aria-invalid={error ? true : undefined}
          aria-describedby={describedBy(fieldId, hint, error)}
          className={clsx(FIELD_CLASS, 'appearance-none pr-8', fieldClassName)}
        />
        <svg
          viewBox="0 0 20 20"
          className="pencil pointer-events-none absolute top-1/2 right-2.5 size-4 -translate-y-1/2"
          aria-hidden="true"
        >
          <path d="M4.5 7.5C6.5 9.5 8 11 10 13c2-2 3.5-3.5 5.5-5.5" />
        </svg>
      </div>
    </FieldFrame>
  );
}
