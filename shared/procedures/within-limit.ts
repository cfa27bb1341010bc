import type { Cause, Severity } from '../findings/cause';
import type { NumberLimit, ProcedureStep } from './procedure-content';
import type { ComponentKind } from './step-kind';

/** What the motor's nameplate says, for the connection in use; null where it is not known. */
export interface MotorNameplate {
  /** Rated volts. */
  readonly volts: number | null;
  /** Full-load amperes at those volts. */
  readonly amps: number | null;
}

/** Both ends inclusive; null where that side is open. */
export interface Limit {
  readonly low: number | null;
  readonly high: number | null;
}

/** What was entered at a step. */
export type Reading =
  | { readonly kind: 'check'; readonly ok: boolean }
  | { readonly kind: 'number'; readonly value: number }
  | { readonly kind: 'choice'; readonly choice: string }
  | { readonly kind: 'text'; readonly text: string }
  | { readonly kind: 'photo'; readonly photoIds: readonly string[] };

/** What a reading out of its limits turns into. */
export interface FindingDraft {
  readonly component: ComponentKind | null;
  readonly cause: Cause;
  readonly severity: Severity;
}

/**
 * The limit of a number step on one unit; null where there is none to hold the value against,
 * because the procedure sets none or the nameplate it comes from is not recorded.
 *
 * - `nameplate-amps`: at most the full-load amperes on the motor's own nameplate. NEC 430.6(A): the
 *   table values size circuits, the nameplate is what a running motor is held against (quoted
 *   second-hand). A ½ hp motor marked 9.8 A at 115 V: 0 to 9.8 A.
 * - `nameplate-volts`: rated volts ±10 %, NEMA MG 1-12.44. 230 V: 207 to 253 V. 115 V: 103.5 to
 *   126.5 V.
 */
export function limitOf(number: NumberLimit, nameplate: MotorNameplate): Limit | null {
  if (number.limitFrom === 'nameplate-amps') {
    return nameplate.amps === null ? null : { low: number.low ?? null, high: nameplate.amps };
  }
  if (number.limitFrom === 'nameplate-volts') {
    if (nameplate.volts === null) return null;
    return { low: toTenth(nameplate.volts * 0.9), high: toTenth(nameplate.volts * 1.1) };
  }
  if (number.low === undefined && number.high === undefined) return null;
  return { low: number.low ?? null, high: number.high ?? null };
}

/**
 * Whether a reading is within its limits; null where the step has nothing to judge by (words,
 * pictures, numbers without a limit, an answer that is not one of the step's).
 *
 * @example withinLimit(oilDrops, { kind: 'number', value: 2 }, plate) // false where high is 1
 */
export function withinLimit(
  step: ProcedureStep,
  reading: Reading,
  nameplate: MotorNameplate,
): boolean | null {
  if (step.kind === 'check' && reading.kind === 'check') return reading.ok;
  if (step.kind === 'choice' && reading.kind === 'choice') {
    const choice = step.choices.find(({ key }) => key === reading.choice);
    return choice ? !choice.outOfLimit : null;
  }
  if (step.kind === 'number' && reading.kind === 'number') {
    const limit = limitOf(step.number, nameplate);
    return limit && isWithin(reading.value, limit);
  }
  return null;
}

/** Whether a value lies in a limit; its ends belong to it. */
export function isWithin(value: number, { low, high }: Limit): boolean {
  return (low === null || value >= low) && (high === null || value <= high);
}

/**
 * The finding that a reading makes: null when it is within its limits, when nothing judges it, or
 * when the step is not meant to make findings.
 */
export function findingOf(
  step: ProcedureStep,
  reading: Reading,
  nameplate: MotorNameplate,
): FindingDraft | null {
  if (withinLimit(step, reading, nameplate) !== false) return null;
  const choice =
    step.kind === 'choice' && reading.kind === 'choice'
      ? step.choices.find(({ key }) => key === reading.choice)
      : undefined;
  const severity = choice?.severity ?? step.severity;
  if (!severity) return null;
  return {
    component: step.component ?? null,
    cause: choice?.cause ?? step.cause ?? 'other',
    severity,
  };
}

/** Meters in the field show tenths; binary fractions must not turn 126.5 into out of range. */
function toTenth(value: number): number {
  return Math.round(value * 10) / 10;
}
