import type { FieldError } from '../problem';
import type { LocalizedText, ProcedureContent, ProcedureStep } from './procedure-content';

type Fail = (field: string, reason: string, message: string) => void;

/**
 * What keeps a draft from being published, all of it at once; empty when it may be. A draft may be
 * saved half-written, a published version may not: it is followed with hot oil about.
 */
export function publishFaults(content: ProcedureContent): FieldError[] {
  const faults: FieldError[] = [];
  const fail: Fail = (field, reason, message) => faults.push({ field, reason, message });
  const both = (field: string, text: LocalizedText | undefined) => {
    if (text && text.en === '') fail(`${field}.en`, 'required', 'The English text is missing.');
    if (text && text.es === '') fail(`${field}.es`, 'required', 'The Spanish text is missing.');
  };
  both('title', content.title);
  both('purpose', content.purpose);
  for (const list of ['tools', 'parts', 'cautions'] as const) {
    content[list].forEach((text, index) => both(`${list}.${index}`, text));
  }
  if (content.steps.length === 0) fail('steps', 'required', 'A procedure needs a step.');
  const keys = content.steps.map(({ key }) => key);
  content.steps.forEach((step, index) => {
    const at = `steps.${index}`;
    both(`${at}.text`, step.text);
    both(`${at}.help`, step.help);
    both(`${at}.caution`, step.caution);
    if (keys.indexOf(step.key) !== index) {
      fail(`${at}.key`, 'twice', `Another step is called “${step.key}” too.`);
    }
    stepFaults(step, at, both, fail);
  });
  return faults;
}

function stepFaults(
  step: ProcedureStep,
  at: string,
  both: (field: string, text: LocalizedText | undefined) => void,
  fail: Fail,
): void {
  if (step.kind === 'number') {
    const { unit, low, high, basis } = step.number;
    if (unit === '') fail(`${at}.number.unit`, 'required', 'Name the unit of the number.');
    if (low !== undefined && high !== undefined && low > high) {
      fail(`${at}.number.high`, 'below-low', 'The upper limit lies below the lower one.');
    }
    both(`${at}.number.basis`, basis);
  }
  if (step.kind === 'choice') {
    if (step.choices.length < 2) {
      fail(`${at}.choices`, 'too-few', 'A choice needs at least two answers.');
    }
    const keys = step.choices.map(({ key }) => key);
    step.choices.forEach((choice, index) => {
      both(`${at}.choices.${index}.text`, choice.text);
      if (keys.indexOf(choice.key) !== index) {
        fail(`${at}.choices.${index}.key`, 'twice', `Another answer is “${choice.key}” too.`);
      }
    });
  }
  if (step.severity && !step.cause && (step.kind === 'check' || step.kind === 'number')) {
    fail(`${at}.cause`, 'required', 'A step that makes a finding names its usual cause.');
  }
}
