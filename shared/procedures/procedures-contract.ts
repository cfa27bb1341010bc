import * as z from 'zod';
import { endpoint } from '../contract/endpoint';
import { procedureContent } from './procedure-content';

const code = z
  .string()
  .trim()
  .regex(/^[a-z0-9]+(-[a-z0-9]+)*$/, 'Lower-case letters, digits and hyphens.')
  .max(60);
const version = z.int().min(0);
const byId = z.strictObject({ id: z.uuid() });
const title = z.strictObject({ en: z.string(), es: z.string() });

export const procedureRow = z.strictObject({
  id: z.uuid(),
  code: z.string(),
  title,
  minutes: z.int(),
  steps: z.int(),
  /** Number of the version in force; null before the first publication. */
  published: z.int().nullable(),
  publishedAt: z.iso.datetime().nullable(),
  hasDraft: z.boolean(),
  /** Rules in force that use it. */
  rules: z.int(),
  retiredAt: z.iso.datetime().nullable(),
});

export const procedureVersion = z.strictObject({
  id: z.uuid(),
  number: z.int(),
  content: procedureContent,
  publishedAt: z.iso.datetime().nullable(),
  publishedBy: z.string().nullable(),
  version,
});

export const procedure = z.strictObject({
  id: z.uuid(),
  code: z.string(),
  retiredAt: z.iso.datetime().nullable(),
  version,
  /** Newest first; the draft, if there is one, leads. */
  versions: z.array(procedureVersion),
  rules: z.array(
    z.strictObject({
      id: z.uuid(),
      name: z.string(),
      programmeId: z.uuid(),
      programmeName: z.string(),
    }),
  ),
  mayEdit: z.boolean(),
});

export const listProcedures = endpoint({
  method: 'GET',
  path: '/procedures',
  summary: 'Procedures with the version in force',
  access: 'procedures.read',
  query: z.strictObject({
    q: z.string().trim().max(200).default(''),
    state: z.enum(['live', 'published', 'retired', 'all']).default('live'),
    sort: z
      .enum(['title', '-title', 'minutes', '-minutes', 'published', '-published'])
      .default('title'),
    locale: z.enum(['en', 'es']).default('en'),
    page: z.coerce.number().int().min(1).default(1),
    pageSize: z.coerce.number().int().min(1).max(200).default(50),
  }),
  reply: z.strictObject({
    rows: z.array(procedureRow),
    total: z.int(),
    page: z.int(),
    pageSize: z.int(),
  }),
});

export const readProcedure = endpoint({
  method: 'GET',
  path: '/procedures/:id',
  summary: 'One procedure with all its versions',
  access: 'procedures.read',
  params: byId,
  reply: procedure,
});

export const createProcedure = endpoint({
  method: 'POST',
  path: '/procedures',
  summary: 'Begin a procedure with its first draft',
  access: 'procedures.edit',
  body: z.strictObject({ id: z.uuid(), versionId: z.uuid(), code, content: procedureContent }),
  reply: procedure,
});

export const addStarterProcedures = endpoint({
  method: 'POST',
  path: '/procedures/starters',
  summary: 'Add the starter procedures that are not there yet, published',
  access: 'procedures.edit',
  reply: z.strictObject({ added: z.int() }),
});

export const beginDraft = endpoint({
  method: 'POST',
  path: '/procedures/:id/draft',
  summary: 'Begin a new draft from the last published version',
  access: 'procedures.edit',
  params: byId,
  body: z.strictObject({ versionId: z.uuid() }),
  reply: procedure,
});

export const saveDraft = endpoint({
  method: 'PUT',
  path: '/procedures/:id/draft',
  summary: 'Save the draft, finished or not',
  access: 'procedures.edit',
  params: byId,
  body: z.strictObject({ version, content: procedureContent }),
  reply: procedure,
});

export const discardDraft = endpoint({
  method: 'DELETE',
  path: '/procedures/:id/draft',
  summary: 'Throw the draft away',
  access: 'procedures.edit',
  params: byId,
  body: z.strictObject({ version }),
  reply: procedure,
});

export const publishDraft = endpoint({
  method: 'POST',
  path: '/procedures/:id/publish',
  summary: 'Publish the draft: from then on it never changes',
  access: 'procedures.edit',
  params: byId,
  body: z.strictObject({ version }),
  reply: procedure,
});

export const retireProcedure = endpoint({
  method: 'POST',
  path: '/procedures/:id/retire',
  summary: 'Retire a procedure that no rule in force uses',
  access: 'procedures.edit',
  params: byId,
  body: z.strictObject({ version }),
  reply: procedure,
});

export const restoreProcedure = endpoint({
  method: 'POST',
  path: '/procedures/:id/restore',
  summary: 'Take a retired procedure back into use',
  access: 'procedures.edit',
  params: byId,
  body: z.strictObject({ version }),
  reply: procedure,
});

export const proceduresEndpoints = [
  listProcedures,
  readProcedure,
  createProcedure,
  addStarterProcedures,
  beginDraft,
  saveDraft,
  discardDraft,
  publishDraft,
  retireProcedure,
  restoreProcedure,
];
