import type { ReactNode } from 'react';

export interface FieldFrameProps {
  id: string;
  label: string;
  /** One sentence below the field. */
  hint?: ReactNode;
  error?: string;
  children: ReactNode;
  className?: string;
}

/** The look that every field shares. */
export const FIELD_CLASS =
  'w-full min-h-9 touch:min-h-11 rounded-control border border-graphite bg-sheet px-3 py-1.5 text-base text-ink aria-invalid:border-2 aria-invalid:border-ink disabled:opacity-55';

/** The ids a field is described by, or undefined. */
export function describedBy(id: string, hint: ReactNode, error: string | undefined): string | undefined {
  return [hint ? `${id}-hint` : '', error ? `${id}-error` : ''].filter(Boolean).join(' ') || undefined;
}

/** A label above, a hint and what is wrong below. */
export function FieldFrame({ id, label, hint, error, children, className }: FieldFrameProps) {
  return (
    <div className={className}>
      <label htmlFor={id} className="mb-1 block text-sm font-semibold">
        {label}
      </label>
      {children}
      {hint && (
        <p id={`${id}-hint`} className="mt-1 text-xs text-graphite">
          {hint}
        </p>
      )}
      {error && (
        <p id={`${id}-error`} className="mt-1 text-sm font-semibold" role="alert">
          {error}
        </p>
      )}
    </div>
  );
}
