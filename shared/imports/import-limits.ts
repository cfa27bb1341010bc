/** Bounds of what is taken in, so that no file can exhaust a server. */
export const importLimits = {
  /** The file as it is sent, in bytes. */
  fileBytes: 25_000_000,
  /** All that an XLSX file unpacks to, in bytes. */
  unpackedBytes: 200_000_000,
  rows: 100_000,
  columns: 200,
  /** Characters of one cell. */
  cell: 2_000,
  /** Problems that are kept; a file with more than these is wrong as a whole. */
  problems: 20_000,
} as const;
