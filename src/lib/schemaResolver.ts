import type { FieldErrors, FieldValues, Resolver } from 'react-hook-form';
import type { z } from 'zod';

/** Lets a form check itself with the same schema the server uses; the first sentence for each field is shown. */
export function schemaResolver<V extends FieldValues>(schema: z.ZodType<unknown, V>): Resolver<V> {
  return (values) => {
    const parsed = schema.safeParse(values);
    if (parsed.success) return { values, errors: {} };
    const errors: Record<string, { type: string; message: string }> = {};
    for (const issue of parsed.error.issues) {
      const field = String(issue.path[0] ?? 'root');
      errors[field] ??= { type: issue.code ?? 'custom', message: issue.message };
    }
    return { values: {}, errors: errors as FieldErrors<V> };
  };
}
