import * as z from 'zod';
import { causes, severities } from '../findings/cause';
import { componentKinds, limitSources } from './step-kind';

/** A text in both languages. A draft may leave either empty; publishing asks for both. */
const bothLanguages = (longest: number) =>
  z.strictObject({ en: z.string().trim().max(longest), es: z.string().trim().max(longest) });

export const localizedText = bothLanguages(2000);

/** Names a step or an answer for good: readings of years are compared by it. */
const key = z.string().regex(/^[a-z0-9]+(-[a-z0-9]+)*$/, 'Lower-case letters, digits and hyphens.');

const everyStep = {
  key: key.max(60),
  text: bothLanguages(400),
  help: localizedText.optional(),
  /** Shown before the step, and to be confirmed where it has one. */
  caution: bothLanguages(600).optional(),
  required: z.boolean(),
  component: z.enum(componentKinds).optional(),
  /** What a finding of this step is put down to; without a severity the step makes no finding. */
  cause: z.enum(causes).optional(),
  severity: z.enum(severities).optional(),
};

export const numberLimit = z.strictObject({
  /** As shown beside the value: A, V, s, drops/min, °F. */
  unit: z.string().trim().max(20),
  low: z.number().optional(),
  high: z.number().optional(),
  limitFrom: z.enum(limitSources).optional(),
  /** Where the limit comes from, or that it is a starting value. */
  basis: bothLanguages(300).optional(),
});

export const stepChoice = z.strictObject({
  key: key.max(40),
  text: bothLanguages(200),
  outOfLimit: z.boolean().optional(),
  /** In place of the step's own. */
  cause: z.enum(causes).optional(),
  severity: z.enum(severities).optional(),
});

export const procedureStep = z.discriminatedUnion('kind', [
  z.strictObject({ kind: z.literal('check'), ...everyStep }),
  z.strictObject({ kind: z.literal('number'), ...everyStep, number: numberLimit }),
  z.strictObject({ kind: z.literal('choice'), ...everyStep, choices: z.array(stepChoice).max(12) }),
  z.strictObject({ kind: z.literal('text'), ...everyStep }),
  z.strictObject({ kind: z.literal('photo'), ...everyStep }),
]);

/** The written inspection. Kept whole in each version, so that a published one never changes. */
export const procedureContent = z.strictObject({
  title: bothLanguages(120),
  purpose: localizedText,
  minutes: z.int().min(1).max(480),
  tools: z.array(bothLanguages(120)).max(40),
  parts: z.array(bothLanguages(120)).max(40),
  /** For the whole procedure, shown before its first step. */
  cautions: z.array(bothLanguages(600)).max(20),
  steps: z.array(procedureStep).max(60),
});

export type LocalizedText = z.infer<typeof localizedText>;
export type NumberLimit = z.infer<typeof numberLimit>;
export type StepChoice = z.infer<typeof stepChoice>;
export type ProcedureStep = z.infer<typeof procedureStep>;
export type ProcedureContent = z.infer<typeof procedureContent>;
