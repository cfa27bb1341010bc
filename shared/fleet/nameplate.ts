import * as z from 'zod';

/** What a motor's plate says; every figure can be missing, as plates wear off. */
export const nameplate = z.strictObject({
  /** Rated voltage, V. */
  volts: z.number().positive().max(1000).optional(),
  /** Rated current at full load, A. */
  amps: z.number().positive().max(200).optional(),
  horsepower: z.number().positive().max(20).optional(),
  phase: z.union([z.literal(1), z.literal(3)]).optional(),
  /** Rated speed, revolutions per minute. */
  rpm: z.number().positive().max(10_000).optional(),
});

export type Nameplate = z.output<typeof nameplate>;
