import type { StepReading } from '@shared/inspections/inspections-contract';
import type { ProcedureContent, ProcedureStep } from '@shared/procedures/procedure-content';
import type { FieldError } from '@shared/problem';

/** Everything that keeps readings from being taken, each named by its step; empty when all fit. */
export function readingFaults(
  content: ProcedureContent,
  readings: readonly StepReading[],
): FieldError[] {
  const entered = new Map(readings.map((reading) => [reading.step, reading]));
  const faults = content.steps.flatMap((step) => stepFaults(step, entered.get(step.key)));
  for (const { step } of readings) {
    if (!content.steps.some(({ key }) => key === step)) {
      faults.push(fault(step, 'unknown-step', 'This step is not part of the procedure.'));
    }
  }
  if (entered.size < readings.length) {
    faults.push({ field: 'readings', reason: 'twice', message: 'A step was answered twice.' });
  }
  return faults;
}

function stepFaults(step: ProcedureStep, reading: StepReading | undefined): FieldError[] {
  if (!reading || isEmpty(reading)) {
    return step.required ? [fault(step.key, 'required', 'This step needs an answer.')] : [];
  }
  if (reading.kind !== step.kind) {
    return [fault(step.key, 'wrong-kind', `This step asks for a ${step.kind}.`)];
  }
  if (step.kind === 'choice' && reading.kind === 'choice') {
    const known = step.choices.some(({ key }) => key === reading.choice);
    if (!known) return [fault(step.key, 'unknown-choice', 'This is not one of the answers.')];
  }
  return [];
}

function isEmpty(reading: StepReading): boolean {
  if (reading.kind === 'text') return reading.text.trim() === '';
  return reading.kind === 'photo' && reading.photoIds.length === 0;
}

const fault = (step: string, reason: string, message: string): FieldError => ({
  field: `readings.${step}`,
  reason,
  message,
});
