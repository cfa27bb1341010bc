import type { QueryOf, ReplyOf } from '@shared/contract/endpoint';
import { columnLetters } from '@shared/exports/column-letters';
import type {
  ImportState,
  listImportProblems,
  listImports,
  readImport,
} from '@shared/imports/imports-contract';
import { type RowProblem, problemInWords } from '@shared/imports/problem-words';
import { notFound } from '@shared/problem';
import { Binds } from '@db/binds';
import type { Tenant } from '@db/tenant-transaction';
import type { Actor } from '../access/actor';
import { visibleImports } from './editable-import';
import type { ImportRecord } from './import-record';

export type ImportView = ReplyOf<typeof readImport>;
export type ImportProblem = ReplyOf<typeof listImportProblems>['rows'][number];
type ProblemFilters = Pick<QueryOf<typeof listImportProblems>, 'field' | 'reason'>;

interface Row
  extends
    Pick<ImportView, 'id' | 'kind' | 'fileName' | 'fileBytes' | 'format' | 'version' | 'columns'>,
    Pick<ImportView, 'dateOrder' | 'checked' | 'mode' | 'error' | 'createdBy'> {
  readonly jobKind: ImportRecord['jobKind'];
  readonly jobState: ImportRecord['jobState'];
  readonly done: number | null;
  readonly total: number | null;
  readonly result: ImportView['imported'];
  readonly createdAt: Date;
  readonly finishedAt: Date | null;
}

const columns = `i.id, i.kind, i.file_name AS "fileName", i.file_bytes AS "fileBytes", i.format,
  i.version, i.columns, i.date_order AS "dateOrder", i.checked, i.mode, j.error,
  p.name AS "createdBy", j.kind AS "jobKind", j.state AS "jobState", j.done, j.total, j.result,
  i.created_at AS "createdAt", j.finished_at AS "finishedAt"`;
const from = `FROM imports i JOIN people p ON p.id = i.created_by
  LEFT JOIN long_jobs j ON j.id = i.job_id`;

function stateOf({ jobKind, jobState }: Row): ImportState {
  if (jobState === null) return 'mapping';
  if (jobState === 'failed' || jobState === 'cancelled') return jobState;
  const taking = jobKind === 'import-rows';
  if (jobState === 'finished') return taking ? 'imported' : 'checked';
  return taking ? 'importing' : 'checking';
}

function present(row: Row): ImportView {
  const { jobKind, jobState: _, done, total, result, createdAt, finishedAt, ...rest } = row;
  const state = stateOf(row);
  const running = state === 'checking' || state === 'importing';
  return {
    ...rest,
    state,
    progress: running ? { done: done ?? 0, total } : null,
    imported: jobKind === 'import-rows' && !running ? result : null,
    createdAt: createdAt.toISOString(),
    finishedAt: finishedAt?.toISOString() ?? null,
  };
}

/** Imports in sight, newest first. */
export async function pageOfImports(
  tenant: Tenant,
  actor: Actor,
  { page, pageSize }: QueryOf<typeof listImports>,
): Promise<ReplyOf<typeof listImports>> {
  const binds = new Binds();
  const where = visibleImports(actor, binds);
  const count = await tenant.row<{ total: number }>(
    `SELECT count(*)::int AS total FROM imports i WHERE ${where}`,
    binds.values,
  );
  const rows = await tenant.rows<Row>(
    `SELECT ${columns} ${from} WHERE ${where} ORDER BY i.created_at DESC, i.id
     LIMIT ${binds.add(pageSize)} OFFSET ${binds.add((page - 1) * pageSize)}`,
    binds.values,
  );
  return { rows: rows.map(asListed), total: count?.total ?? 0, page, pageSize };
}

function asListed(row: Row): ReplyOf<typeof listImports>['rows'][number] {
  const { id, kind, fileName, state, progress, checked, ...rest } = present(row);
  const { imported, createdBy, createdAt, finishedAt } = rest;
  return {
    id,
    kind,
    fileName,
    state,
    progress,
    checked,
    imported,
    createdBy,
    createdAt,
    finishedAt,
  };
}

/** One import. @throws Problem 404 when it does not exist or lies out of the actor's sight. */
export async function importById(tenant: Tenant, actor: Actor, id: string): Promise<ImportView> {
  const binds = new Binds();
  const row = await tenant.row<Row>(
    `SELECT ${columns} ${from} WHERE i.id = ${binds.add(id)} AND ${visibleImports(actor, binds)}`,
    binds.values,
  );
  if (!row) throw notFound('import');
  return present(row);
}

/** What is wrong with an import's rows, from the top of the file, a page of it. */
export async function pageOfProblems(
  tenant: Tenant,
  actor: Actor,
  { columns: ofFile, id }: Pick<ImportView, 'columns' | 'id'>,
  { field, reason, page, pageSize }: ProblemFilters & { page: number; pageSize: number },
): Promise<ReplyOf<typeof listImportProblems>> {
  const binds = new Binds();
  const all = [`import_id = ${binds.add(id)}`];
  if (field) all.push(`field = ${binds.add(field)}`);
  if (reason) all.push(`reason = ${binds.add(reason)}`);
  const where = all.join(' AND ');
  const count = await tenant.row<{ total: number }>(
    `SELECT count(*)::int AS total FROM import_problems WHERE ${where}`,
    binds.values,
  );
  const rows = await tenant.rows<RowProblem & { row: number }>(
    `SELECT row_number AS "row", field, reason, value, params FROM import_problems WHERE ${where}
     ORDER BY row_number, id LIMIT ${binds.add(pageSize)} OFFSET ${binds.add((page - 1) * pageSize)}`,
    binds.values,
  );
  return {
    rows: rows.map((problem) => asShown(problem, ofFile, actor.locale)),
    total: count?.total ?? 0,
    page,
    pageSize,
  };
}

function asShown(
  problem: RowProblem & { row: number },
  ofFile: ImportView['columns'],
  locale: 'en' | 'es',
): ImportProblem {
  const { row, field, reason, value } = problem;
  const at = ofFile.findIndex((column) => field !== null && column.field === field);
  return {
    row,
    field,
    heading: ofFile[at]?.heading ?? null,
    column: at < 0 ? null : columnLetters(at),
    value,
    reason,
    message: problemInWords(problem, locale),
  };
}
