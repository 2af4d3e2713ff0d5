import 'server-only';
import type { z } from 'zod';
import { invalid } from './errors';

/** What a schema makes of a body; what it refuses comes back beside its field, in its own words. */
export function parsed<S extends z.ZodType>(schema: S, body: unknown): z.output<S> {
  const result = schema.safeParse(body);
  if (result.success) return result.data;
  const fields: Record<string, string[]> = {};
  for (const issue of result.error.issues) (fields[issue.path.join('.')] ??= []).push(issue.message);
  const [[first] = ['Look at the form again.']] = Object.values(fields);
  throw invalid(first ?? 'Look at the form again.', fields);
}
