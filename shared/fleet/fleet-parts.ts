import * as z from 'zod';
import { standings } from './fleet-words';

export { fileFormat, fileReply } from '../exports/export-format';

/** Pieces that the contracts of the fleet share. */
export const version = z.int().min(0);
export const byId = z.strictObject({ id: z.uuid() });
export const byVersion = z.strictObject({ version });
export const date = z.iso.date();
export const instant = z.iso.datetime();

/** A line of text that may be empty. */
export const line = (max: number) => z.string().trim().max(max);
/** A line of text that says something. */
export const name = (max: number) => z.string().trim().min(1).max(max);

export const searchOf = <const Sorts extends readonly [string, ...string[]]>(sorts: Sorts) => ({
  q: z.string().trim().max(200).default(''),
  state: z.enum(standings).default('live'),
  sort: z.enum(sorts).default(sorts[0]),
});

export const paging = {
  page: z.coerce.number().int().min(1).max(100_000).default(1),
  pageSize: z.coerce.number().int().min(1).max(200).default(50),
};

export const pageOf = <Row extends z.ZodType>(row: Row) =>
  z.strictObject({ rows: z.array(row), total: z.int(), page: z.int(), pageSize: z.int() });
