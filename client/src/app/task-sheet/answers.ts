import type { Cause, Severity } from '@shared/findings/cause';
import type { ProcedureStep } from '@shared/procedures/procedure-content';
import type { ComponentKind } from '@shared/procedures/step-kind';
import type { Limit, Reading } from '@shared/procedures/within-limit';
import { isWithin } from '@shared/procedures/within-limit';
import type { SentReading } from './task-sheet-api';

/** What was entered so far, by step key. */
export type Answers = Readonly<Record<string, Reading>>;

/** Limits of number steps by key, as the server worked them out for this unit. */
export type Limits = Readonly<Record<string, Limit>>;

/** The finding that a reading out of limit makes when the task is closed. */
export interface FindingAhead {
  readonly severity: Severity;
  readonly cause: Cause;
  readonly component: ComponentKind | null;
}

/** Whether a step has an answer; an empty text and no photo are none. */
export function isAnswered(reading: Reading | undefined): boolean {
  if (!reading) return false;
  if (reading.kind === 'text') return reading.text.trim() !== '';
  return reading.kind !== 'photo' || reading.photoIds.length > 0;
}

/** Whether a reading lies within its limits; null where nothing judges it. */
export function judged(
  step: ProcedureStep,
  reading: Reading | undefined,
  limits: Limits,
): boolean | null {
  if (step.kind === 'check' && reading?.kind === 'check') return reading.ok;
  if (step.kind === 'choice' && reading?.kind === 'choice') {
    const choice = step.choices.find(({ key }) => key === reading.choice);
    return choice ? !choice.outOfLimit : null;
  }
  const limit = limits[step.key];
  return reading?.kind === 'number' && limit ? isWithin(reading.value, limit) : null;
}

/** What a reading will be written down as; null when it is within limits or makes no finding. */
export function findingAhead(
  step: ProcedureStep,
  reading: Reading | undefined,
  limits: Limits,
): FindingAhead | null {
  if (judged(step, reading, limits) !== false) return null;
  const choice =
    step.kind === 'choice' && reading?.kind === 'choice'
      ? step.choices.find(({ key }) => key === reading.choice)
      : undefined;
  const severity = choice?.severity ?? step.severity;
  if (!severity) return null;
  const cause = choice?.cause ?? step.cause ?? 'other';
  return { severity, cause, component: step.component ?? null };
}

/** Steps that must be answered before the task can be closed, in order. */
export function missingSteps(
  steps: readonly ProcedureStep[],
  answers: Answers,
): readonly ProcedureStep[] {
  return steps.filter((step) => step.required && !isAnswered(answers[step.key]));
}

/** The answers as they are sent: empty ones left out, in the order of the steps. */
export function sentReadings(steps: readonly ProcedureStep[], answers: Answers): SentReading[] {
  return steps.flatMap((step) => {
    const reading = answers[step.key];
    if (!reading || !isAnswered(reading) || reading.kind !== step.kind) return [];
    return [{ ...reading, step: step.key } as SentReading];
  });
}

/**
 * A number as people type it: a comma may stand for the point, spaces do not count. Null for what
 * is no number.
 *
 * @example readNumber('9,8') // 9.8
 */
export function readNumber(text: string): number | null {
  const plain = text.replace(/\s/g, '').replace(',', '.');
  return /^[+-]?(\d+\.?\d*|\.\d+)$/.test(plain) ? Number(plain) : null;
}
