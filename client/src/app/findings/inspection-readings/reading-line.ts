import type { LocalizedText, ProcedureStep } from '@shared/procedures/procedure-content';
import type { TaskSheet } from '../findings-api';

/** A step of an inspection as it was answered. */
export interface ReadingLine {
  readonly key: string;
  readonly step: string;
  readonly entered: string;
  /** What it was held against; empty where there is nothing to hold it against. */
  readonly limit: string;
  readonly withinLimits: boolean | null;
}

type Entered = NonNullable<TaskSheet['inspection']>['readings'][number]['reading'];

/** The answers of an inspection beside their limits, in the order of the steps. */
export function readingLines(
  sheet: TaskSheet,
  text: (both: LocalizedText) => string,
  format: (value: number) => string,
): readonly ReadingLine[] {
  const steps = new Map(sheet.procedure.steps.map((step) => [step.key, step]));
  return (sheet.inspection?.readings ?? []).map(({ reading, withinLimits }) => {
    const step = steps.get(reading.step);
    return {
      key: reading.step,
      step: step ? text(step.text) : reading.step,
      entered: enteredWords(reading, step, text, format),
      limit: step?.kind === 'number' ? limitText(sheet, step, format) : '',
      withinLimits,
    };
  });
}

function enteredWords(
  reading: Entered,
  step: ProcedureStep | undefined,
  text: (both: LocalizedText) => string,
  format: (value: number) => string,
): string {
  switch (reading.kind) {
    case 'check':
      return reading.ok
        ? $localize`:@@findings.reading.ok:in order`
        : $localize`:@@findings.reading.not-ok:not in order`;
    case 'number':
      return withUnit(format(reading.value), step);
    case 'choice': {
      const choice =
        step?.kind === 'choice' ? step.choices.find(({ key }) => key === reading.choice) : null;
      return choice ? text(choice.text) : reading.choice;
    }
    case 'text':
      return reading.text;
    case 'photo':
      return reading.photoIds.length === 1
        ? $localize`:@@findings.reading.photo:1 photo`
        : $localize`:@@findings.reading.photos:${reading.photoIds.length}:count: photos`;
  }
}

function limitText(
  sheet: TaskSheet,
  step: ProcedureStep & { kind: 'number' },
  format: (value: number) => string,
): string {
  const { low, high } = sheet.limits[step.key] ?? { low: null, high: null };
  if (low !== null && high !== null) {
    const range = `${format(low)} – ${format(high)}`;
    return withUnit(range, step);
  }
  if (high !== null) {
    const most = withUnit(format(high), step);
    return $localize`:@@findings.reading.most:at most ${most}:value:`;
  }
  if (low !== null) {
    const least = withUnit(format(low), step);
    return $localize`:@@findings.reading.least:at least ${least}:value:`;
  }
  return '';
}

function withUnit(value: string, step: ProcedureStep | undefined): string {
  const unit = step?.kind === 'number' ? step.number.unit : '';
  return unit ? `${value} ${unit}` : value;
}
