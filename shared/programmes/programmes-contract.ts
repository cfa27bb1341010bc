import * as z from 'zod';
import { endpoint } from '../contract/endpoint';
import { recurrenceSet, ruleDefinition } from './rule-definition';

const version = z.int().min(0);
const byId = z.strictObject({ id: z.uuid() });
const date = z.iso.date();
const bothLanguages = z.strictObject({ en: z.string(), es: z.string() });
const reach = z.strictObject({ stores: z.int(), units: z.int() });

export const scopes = ['chain', 'region', 'store', 'unit'] as const;

const programmeFields = z.strictObject({
  name: z.string().trim().min(1).max(120),
  description: z.string().trim().max(2000),
});

export const programmeRow = z.strictObject({
  id: z.uuid(),
  name: z.string(),
  description: z.string(),
  retiredAt: z.iso.datetime().nullable(),
  rules: z.int(),
  enrolments: z.int(),
  /** Places with tasks of it to come. */
  reach,
});

export const ruleReply = ruleDefinition.extend({
  id: z.uuid(),
  programmeId: z.uuid(),
  programmeName: z.string(),
  procedureTitle: bothLanguages,
  /** The rule in words. */
  words: bothLanguages,
  revision: z.int(),
  retiredAt: z.iso.datetime().nullable(),
  version,
  reach,
  mayEdit: z.boolean(),
});

export const enrolmentReply = z.strictObject({
  id: z.uuid(),
  scopeKind: z.enum(scopes),
  scopeId: z.uuid(),
  label: z.string(),
  /** Takes its place out of what a wider enrolment put in. */
  exception: z.boolean(),
  fromOn: date,
  untilOn: date.nullable(),
  version,
  /** Live places in its scope. */
  reach,
  mayEdit: z.boolean(),
});

export const programme = z.strictObject({
  id: z.uuid(),
  name: z.string(),
  description: z.string(),
  retiredAt: z.iso.datetime().nullable(),
  version,
  rules: z.array(ruleReply),
  enrolments: z.array(enrolmentReply),
  reach,
  /** Whether this person may change the programme and its rules. */
  mayEdit: z.boolean(),
  /** Whether this person may enrol anything at all. */
  mayEnrol: z.boolean(),
});

export const listProgrammes = endpoint({
  method: 'GET',
  path: '/programmes',
  summary: 'Programmes with how far they reach',
  access: 'programmes.read',
  query: z.strictObject({
    q: z.string().trim().max(200).default(''),
    state: z.enum(['live', 'retired', 'all']).default('live'),
    sort: z
      .enum(['name', '-name', 'rules', '-rules', 'stores', '-stores', 'units', '-units'])
      .default('name'),
    page: z.coerce.number().int().min(1).default(1),
    pageSize: z.coerce.number().int().min(1).max(200).default(50),
  }),
  reply: z.strictObject({
    rows: z.array(programmeRow),
    total: z.int(),
    page: z.int(),
    pageSize: z.int(),
  }),
});

export const readProgramme = endpoint({
  method: 'GET',
  path: '/programmes/:id',
  summary: 'One programme with its rules and enrolments',
  access: 'programmes.read',
  params: byId,
  reply: programme,
});

export const createProgramme = endpoint({
  method: 'POST',
  path: '/programmes',
  summary: 'Begin a programme',
  access: 'programmes.edit',
  body: programmeFields.extend({ id: z.uuid() }),
  reply: programme,
});

export const editProgramme = endpoint({
  method: 'PATCH',
  path: '/programmes/:id',
  summary: 'Change a programme’s name and description',
  access: 'programmes.edit',
  params: byId,
  body: programmeFields.extend({ version }),
  reply: programme,
});

export const retireProgramme = endpoint({
  method: 'POST',
  path: '/programmes/:id/retire',
  summary: 'Retire a programme: its schedules end',
  access: 'programmes.edit',
  params: byId,
  body: z.strictObject({ version }),
  reply: programme,
});

export const restoreProgramme = endpoint({
  method: 'POST',
  path: '/programmes/:id/restore',
  summary: 'Take a retired programme back into use',
  access: 'programmes.edit',
  params: byId,
  body: z.strictObject({ version }),
  reply: programme,
});

export const listRules = endpoint({
  method: 'GET',
  path: '/rules',
  summary: 'Rules to choose from, by programme and name',
  access: 'tasks.read',
  query: z.strictObject({
    q: z.string().trim().max(200).default(''),
    state: z.enum(['live', 'all']).default('live'),
  }),
  reply: z.strictObject({
    rows: z.array(
      z.strictObject({
        id: z.uuid(),
        name: z.string(),
        programmeId: z.uuid(),
        programmeName: z.string(),
        audience: z.enum(['technician', 'store']),
      }),
    ),
  }),
});

export const readRule = endpoint({
  method: 'GET',
  path: '/rules/:id',
  summary: 'One rule',
  access: 'programmes.read',
  params: byId,
  reply: ruleReply,
});

export const addRule = endpoint({
  method: 'POST',
  path: '/programmes/:id/rules',
  summary: 'Add a rule to a programme',
  access: 'programmes.edit',
  params: byId,
  body: ruleDefinition.extend({ id: z.uuid() }),
  reply: ruleReply,
});

export const editRule = endpoint({
  method: 'PUT',
  path: '/rules/:id',
  summary: 'Change a rule: tasks not yet begun follow the new revision',
  access: 'programmes.edit',
  params: byId,
  body: ruleDefinition.extend({ version }),
  reply: ruleReply,
});

export const previewRuleEdit = endpoint({
  method: 'POST',
  path: '/rules/:id/preview',
  summary: 'What a change of a rule would do to its tasks; nothing is changed',
  access: 'programmes.edit',
  params: byId,
  body: ruleDefinition.extend({ version }),
  reply: z.strictObject({
    /** Tasks that would be written anew. */
    added: z.int(),
    /** Due at the same time, with another window, place, procedure or pair of hands. */
    moved: z.int(),
    /** Taken back. */
    withdrawn: z.int(),
    /** To come, and the same as before. */
    unchanged: z.int(),
    /** Open, deferred or on a published route: they would stay as they are. */
    leftAlone: z.int(),
  }),
});

export const retireRule = endpoint({
  method: 'POST',
  path: '/rules/:id/retire',
  summary: 'Retire a rule: its schedules end',
  access: 'programmes.edit',
  params: byId,
  body: z.strictObject({ version }),
  reply: ruleReply,
});

export const restoreRule = endpoint({
  method: 'POST',
  path: '/rules/:id/restore',
  summary: 'Take a retired rule back into use',
  access: 'programmes.edit',
  params: byId,
  body: z.strictObject({ version }),
  reply: ruleReply,
});

export const listRuleRevisions = endpoint({
  method: 'GET',
  path: '/rules/:id/revisions',
  summary: 'What a rule said before, newest first',
  access: 'programmes.read',
  params: byId,
  reply: z.strictObject({
    rows: z.array(
      z.strictObject({
        revision: z.int(),
        definition: ruleDefinition,
        words: bothLanguages,
        madeAt: z.iso.datetime(),
        madeBy: z.string().nullable(),
      }),
    ),
  }),
});

export const findPlaces = endpoint({
  method: 'GET',
  path: '/programmes/:id/places',
  summary: 'Chains, regions, stores and units that this person may enrol',
  access: 'programmes.edit',
  params: byId,
  query: z.strictObject({
    kind: z.enum(scopes),
    q: z.string().trim().max(200).default(''),
  }),
  reply: z.strictObject({
    rows: z.array(
      z.strictObject({ id: z.uuid(), label: z.string(), reach, enrolled: z.boolean() }),
    ),
  }),
});

const enrolmentFields = z.strictObject({ fromOn: date, untilOn: date.nullable() });

export const enrol = endpoint({
  method: 'POST',
  path: '/programmes/:id/enrolments',
  summary:
    'Put a chain, region, store or unit under a programme, or take it out of a wider enrolment',
  access: 'programmes.edit',
  params: byId,
  body: enrolmentFields.extend({
    id: z.uuid(),
    scopeKind: z.enum(scopes),
    scopeId: z.uuid(),
    exception: z.boolean(),
  }),
  reply: programme,
});

export const editEnrolment = endpoint({
  method: 'PATCH',
  path: '/enrolments/:id',
  summary: 'Change from when until when an enrolment stands',
  access: 'programmes.edit',
  params: byId,
  body: enrolmentFields.extend({ version }),
  reply: programme,
});

export const unenrol = endpoint({
  method: 'DELETE',
  path: '/enrolments/:id',
  summary: 'Remove an enrolment or an exception',
  access: 'programmes.edit',
  params: byId,
  body: z.strictObject({ version }),
  reply: programme,
});

export const previewRecurrence = endpoint({
  method: 'POST',
  path: '/recurrence/preview',
  summary: 'A recurrence in words with its next dates, or what is wrong with which part',
  access: 'programmes.read',
  body: z.strictObject({ recurrence: recurrenceSet, timeZone: z.string().max(60) }),
  reply: z.strictObject({
    words: bothLanguages.nullable(),
    /** The next twelve, as a wall clock in that zone shows them. */
    next: z.array(z.string()),
    problems: z.array(
      z.strictObject({
        /** Where in the recurrence: `rrules.0`. */
        field: z.string(),
        part: z.string(),
        code: z.string(),
        params: z.record(z.string(), z.union([z.string(), z.number()])),
        message: z.string(),
      }),
    ),
  }),
});

export const programmesEndpoints = [
  listProgrammes,
  readProgramme,
  createProgramme,
  editProgramme,
  retireProgramme,
  restoreProgramme,
  listRules,
  readRule,
  addRule,
  editRule,
  previewRuleEdit,
  retireRule,
  restoreRule,
  listRuleRevisions,
  findPlaces,
  enrol,
  editEnrolment,
  unenrol,
  previewRecurrence,
];
