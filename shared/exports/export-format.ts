import * as z from 'zod';

/** The files that a list can be taken away as. */
export const exportFormats = ['csv', 'xlsx'] as const;
export type ExportFormat = (typeof exportFormats)[number];

/** The part of an export's query that says which file is wanted; the filters of the list go beside. */
export const fileFormat = { format: z.enum(exportFormats) };

/** What a download answers: a file, not JSON. */
export const fileReply = z.undefined();

/** The longest list that becomes one file; a longer one has to be narrowed by its filters. */
export const exportRowLimit = 100_000;
