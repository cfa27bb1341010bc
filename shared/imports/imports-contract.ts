import * as z from 'zod';
import { endpoint } from '../contract/endpoint';
import { fileFormat, fileReply } from '../exports/export-format';
import { dateOrders, importFieldNames, importKinds } from './import-fields';
import { problemReasons } from './problem-words';

const byId = z.strictObject({ id: z.uuid() });
const field = z.enum(importFieldNames);
const instant = z.iso.datetime();

/**
 * Where an import stands: its columns wait to be confirmed, its rows are being looked at, they can be
 * taken in, they are being taken in, they are in.
 */
export const importStates = [
  'mapping',
  'checking',
  'checked',
  'importing',
  'imported',
  'failed',
  'cancelled',
] as const;
export type ImportState = (typeof importStates)[number];

/** Everything or nothing, or whatever rows are without a problem. */
export const importModes = ['all-or-nothing', 'good-rows'] as const;
export type ImportMode = (typeof importModes)[number];

/** How many of one sort of thing are made, changed, or stand in the file as they are known already. */
const tally = z.strictObject({ made: z.int(), changed: z.int(), same: z.int() });

/** What the check found, or what the import did. */
export const importOutcome = z.strictObject({
  rows: z.int(),
  goodRows: z.int(),
  badRows: z.int(),
  problems: z.int(),
  /** There were more problems than are kept. */
  problemsCut: z.boolean(),
  chains: tally,
  regions: tally,
  stores: tally,
  units: tally,
  components: tally,
  /** Names that are new: a slip of the pen shows here. At most 100 of each. */
  newChains: z.array(z.string()),
  newRegions: z.array(z.string()),
});
export type ImportOutcome = z.output<typeof importOutcome>;

export const importView = z.strictObject({
  id: z.uuid(),
  kind: z.enum(importKinds),
  fileName: z.string(),
  fileBytes: z.int(),
  format: z.enum(['csv', 'xlsx']),
  state: z.enum(importStates),
  version: z.int(),
  /** The file's columns from the left, with their first values and what they are taken for. */
  columns: z.array(
    z.strictObject({
      heading: z.string(),
      samples: z.array(z.string()),
      field: field.nullable(),
    }),
  ),
  dateOrder: z.enum(dateOrders),
  /** While checking or importing. `total` is in rows, not known at first. */
  progress: z.strictObject({ done: z.int(), total: z.int().nullable() }).nullable(),
  checked: importOutcome.nullable(),
  mode: z.enum(importModes).nullable(),
  imported: importOutcome.nullable(),
  /** Why it failed, in words. */
  error: z.string().nullable(),
  createdBy: z.string(),
  createdAt: instant,
  finishedAt: instant.nullable(),
});

export const importRow = importView.pick({
  id: true,
  kind: true,
  fileName: true,
  state: true,
  progress: true,
  checked: true,
  imported: true,
  createdBy: true,
  createdAt: true,
  finishedAt: true,
});

/** Something wrong with a row; `message` is in the reader's language. */
export const importProblem = z.strictObject({
  /** As a spreadsheet numbers it: the headings are row 1. */
  row: z.int(),
  field: field.nullable(),
  /** The file's own heading of the column at fault, and its letter as spreadsheets have it. */
  heading: z.string().nullable(),
  column: z.string().nullable(),
  value: z.string(),
  reason: z.enum(problemReasons),
  message: z.string(),
});

const paging = {
  page: z.coerce.number().int().min(1).max(100_000).default(1),
  pageSize: z.coerce.number().int().min(1).max(200).default(50),
};

export const listImports = endpoint({
  method: 'GET',
  path: '/imports',
  summary: 'Imports of the organisation, newest first',
  access: 'fleet.import',
  query: z.strictObject(paging),
  reply: z.strictObject({
    rows: z.array(importRow),
    total: z.int(),
    page: z.int(),
    pageSize: z.int(),
  }),
});

export const downloadTemplate = endpoint({
  method: 'GET',
  path: '/imports/template',
  summary: 'An empty file with the headings of one kind',
  access: 'fleet.import',
  query: z.strictObject({ kind: z.enum(importKinds), ...fileFormat }),
  reply: fileReply,
});

/**
 * The file goes as the one part `file` of a multipart form (25 MB at most, CSV or XLSX). Nothing is
 * taken in yet: the reply shows the columns and what each is taken for.
 */
export const uploadImport = endpoint({
  method: 'POST',
  path: '/imports',
  summary: 'Send a file, to see what is in it',
  access: 'fleet.import',
  query: z.strictObject({ id: z.uuid(), kind: z.enum(importKinds) }),
  reply: importView,
});

export const readImport = endpoint({
  method: 'GET',
  path: '/imports/:id',
  summary: 'One import: its columns, how far it is, what was found',
  access: 'fleet.import',
  params: byId,
  reply: importView,
});

export const checkImport = endpoint({
  method: 'POST',
  path: '/imports/:id/check',
  summary: 'Say what the columns hold, and have every row looked at; nothing is taken in yet',
  access: 'fleet.import',
  params: byId,
  body: z.strictObject({
    version: z.int().min(0),
    /** For each column from the left what it holds; null where it is passed over. */
    fields: z.array(field.nullable()).max(200),
    dateOrder: z.enum(dateOrders),
  }),
  reply: importView,
});

export const listImportProblems = endpoint({
  method: 'GET',
  path: '/imports/:id/problems',
  summary: 'What is wrong, row by row',
  access: 'fleet.import',
  params: byId,
  query: z.strictObject({
    ...paging,
    field: field.optional(),
    reason: z.enum(problemReasons).optional(),
  }),
  reply: z.strictObject({
    rows: z.array(importProblem),
    total: z.int(),
    page: z.int(),
    pageSize: z.int(),
  }),
});

export const exportImportProblems = endpoint({
  method: 'GET',
  path: '/imports/:id/problems/export',
  summary: 'What is wrong, row by row, as a file',
  access: 'fleet.import',
  params: byId,
  query: z.strictObject(fileFormat),
  reply: fileReply,
});

export const startImport = endpoint({
  method: 'POST',
  path: '/imports/:id/start',
  summary: 'Take the rows in',
  access: 'fleet.import',
  params: byId,
  body: z.strictObject({ version: z.int().min(0), mode: z.enum(importModes) }),
  reply: importView,
});

export const cancelImport = endpoint({
  method: 'POST',
  path: '/imports/:id/cancel',
  summary: 'Stop a check or an import that runs; with only good rows, those already in stay in',
  access: 'fleet.import',
  params: byId,
  reply: importView,
});

export const importsEndpoints = [
  listImports,
  downloadTemplate,
  uploadImport,
  readImport,
  checkImport,
  listImportProblems,
  exportImportProblems,
  startImport,
  cancelImport,
];
