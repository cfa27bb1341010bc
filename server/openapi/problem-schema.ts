/** The JSON Schema of `ProblemDocument` in shared/problem.ts, which is a type without a schema. */
export const problemSchema = {
  type: 'object',
  required: ['type', 'title', 'status', 'code'],
  properties: {
    type: { type: 'string' },
    title: { type: 'string' },
    status: { type: 'integer' },
    code: { type: 'string' },
    detail: { type: 'string' },
    requestId: { type: 'string' },
    errors: {
      type: 'array',
      items: {
        type: 'object',
        required: ['field', 'reason', 'message'],
        properties: {
          field: { type: 'string' },
          reason: { type: 'string' },
          message: { type: 'string' },
          params: { type: 'object' },
        },
      },
    },
  },
} as const;
