import type { Request } from 'express';
import type * as z from 'zod';
import type { Endpoint } from '@shared/contract/endpoint';
import { type FieldError, invalid } from '@shared/problem';

/**
 * Reads the parts of a request by the endpoint's schemas.
 * @throws Problem 422 with every field error of every part at once.
 */
export function readInput(endpoint: Endpoint, req: Request) {
  const errors: FieldError[] = [];
  const read = (schema: z.ZodType | undefined, value: unknown) => {
    if (!schema) return undefined;
    const parsed = schema.safeParse(value);
    if (parsed.success) return parsed.data;
    errors.push(...parsed.error.issues.map(asFieldError));
    return undefined;
  };
  const input = {
    params: read(endpoint.params, req.params),
    query: read(endpoint.query, req.query),
    body: read(endpoint.body, req.body),
  };
  if (errors.length > 0) throw invalid(errors);
  return input;
}

function asFieldError(issue: z.core.$ZodIssue): FieldError {
  return { field: issue.path.join('.'), reason: issue.code, message: issue.message };
}
