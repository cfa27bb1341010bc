import type { NumberLimit } from '@shared/procedures/procedure-content';
import type { ComponentKind, StepKind } from '@shared/procedures/step-kind';

/** What a step of this kind asks for. */
export function kindWord(kind: StepKind): string {
  switch (kind) {
    case 'check':
      return $localize`:@@procedures.kind.check:Check`;
    case 'number':
      return $localize`:@@procedures.kind.number:Number`;
    case 'choice':
      return $localize`:@@procedures.kind.choice:Choice`;
    case 'text':
      return $localize`:@@procedures.kind.text:Words`;
    case 'photo':
      return $localize`:@@procedures.kind.photo:Photo`;
  }
}

export function componentWord(kind: ComponentKind): string {
  switch (kind) {
    case 'pump':
      return $localize`:@@procedures.component.pump:Pump`;
    case 'motor':
      return $localize`:@@procedures.component.motor:Motor`;
    case 'pan':
      return $localize`:@@procedures.component.pan:Pan`;
    case 'hose':
      return $localize`:@@procedures.component.hose:Hose`;
  }
}

/** A number's limit in words, as far as it is known without a unit: "207 to 253 V". */
export function limitWords(number: NumberLimit): string {
  const { low, high, unit, limitFrom } = number;
  if (limitFrom === 'nameplate-amps') {
    return $localize`:@@procedures.limit.amps:at most the amperes on the motor’s nameplate`;
  }
  if (limitFrom === 'nameplate-volts') {
    return $localize`:@@procedures.limit.volts:nameplate volts, 10% either way`;
  }
  if (low !== undefined && high !== undefined) {
    return $localize`:@@procedures.limit.both:${low}:low: to ${high}:high: ${unit}:unit:`;
  }
  if (high !== undefined) {
    return $localize`:@@procedures.limit.high:at most ${high}:high: ${unit}:unit:`;
  }
  if (low !== undefined) {
    return $localize`:@@procedures.limit.low:at least ${low}:low: ${unit}:unit:`;
  }
  return $localize`:@@procedures.limit.none:no limit, ${unit}:unit:`;
}
