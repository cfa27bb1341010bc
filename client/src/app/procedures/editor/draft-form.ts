import { FormArray, FormControl, FormGroup, Validators } from '@angular/forms';
import type { Cause, Severity } from '@shared/findings/cause';
import type {
  LocalizedText,
  ProcedureContent,
  ProcedureStep,
  StepChoice,
} from '@shared/procedures/procedure-content';
import type { ComponentKind, LimitSource, StepKind } from '@shared/procedures/step-kind';
import { uniqueKey } from './unique-key';

const control = <T>(value: T) => new FormControl(value, { nonNullable: true });

/** A text in both languages. */
export function textPair(text: LocalizedText = { en: '', es: '' }) {
  return new FormGroup({ en: control(text.en), es: control(text.es) });
}

export type TextPairForm = ReturnType<typeof textPair>;

export function choiceForm(choice?: StepChoice) {
  return new FormGroup({
    /** Empty until the answer is first saved; then it stays for good. */
    key: control(choice?.key ?? ''),
    text: textPair(choice?.text),
    outOfLimit: control(choice?.outOfLimit ?? false),
    cause: control<Cause | ''>(choice?.cause ?? ''),
    severity: control<Severity | ''>(choice?.severity ?? ''),
  });
}

export type ChoiceForm = ReturnType<typeof choiceForm>;

export function stepForm(step: ProcedureStep | { readonly kind: StepKind }) {
  const given: Partial<ProcedureStep> = 'key' in step ? step : {};
  const number = given.kind === 'number' ? given.number : undefined;
  const choices = given.kind === 'choice' ? (given.choices ?? []) : [];
  return new FormGroup({
    kind: control<StepKind>(step.kind),
    key: control(given.key ?? ''),
    text: textPair(given.text),
    help: textPair(given.help),
    caution: textPair(given.caution),
    required: control(given.required ?? true),
    component: control<ComponentKind | ''>(given.component ?? ''),
    cause: control<Cause | ''>(given.cause ?? ''),
    severity: control<Severity | ''>(given.severity ?? ''),
    number: new FormGroup({
      unit: control(number?.unit ?? ''),
      low: new FormControl<number | null>(number?.low ?? null),
      high: new FormControl<number | null>(number?.high ?? null),
      limitFrom: control<LimitSource | ''>(number?.limitFrom ?? ''),
      basis: textPair(number?.basis),
    }),
    choices: new FormArray(choices.map((choice) => choiceForm(choice))),
  });
}

export type StepForm = ReturnType<typeof stepForm>;

/** The form of a whole procedure, laid out like its content so that faults find their fields. */
export function draftForm(code: string, content: ProcedureContent) {
  return new FormGroup({
    code: new FormControl(code, {
      nonNullable: true,
      validators: [Validators.required, Validators.pattern(/^[a-z0-9]+(-[a-z0-9]+)*$/)],
    }),
    content: new FormGroup({
      title: textPair(content.title),
      purpose: textPair(content.purpose),
      minutes: new FormControl(content.minutes, {
        nonNullable: true,
        validators: [Validators.required, Validators.min(1), Validators.max(480)],
      }),
      tools: new FormArray(content.tools.map((it) => textPair(it))),
      parts: new FormArray(content.parts.map((it) => textPair(it))),
      cautions: new FormArray(content.cautions.map((it) => textPair(it))),
      steps: new FormArray(content.steps.map((it) => stepForm(it))),
    }),
  });
}

export type DraftForm = ReturnType<typeof draftForm>;

/** What a new procedure begins with. */
export const emptyContent: ProcedureContent = {
  title: { en: '', es: '' },
  purpose: { en: '', es: '' },
  minutes: 10,
  tools: [],
  parts: [],
  cautions: [],
  steps: [],
};

/**
 * The content that a form holds. What is left empty is left out; steps and answers without a key get
 * one from their English text, which they keep.
 */
export function contentOf(form: DraftForm): ProcedureContent {
  const { title, purpose, minutes, tools, parts, cautions } = form.controls.content.getRawValue();
  const steps = form.controls.content.controls.steps.controls;
  nameSteps(steps);
  return { title, purpose, minutes, tools, parts, cautions, steps: steps.map(stepOf) };
}

/** Gives every step and answer without a key one of its own. */
function nameSteps(steps: readonly StepForm[]): void {
  for (const forms of [steps, ...steps.map((step) => step.controls.choices.controls)]) {
    const taken = new Set(forms.map((form) => form.controls.key.value).filter(Boolean));
    for (const form of forms) {
      const { key, text } = form.controls;
      if (key.value) continue;
      key.setValue(uniqueKey(text.value.en || text.value.es || '', taken));
      taken.add(key.value);
    }
  }
}

function stepOf(form: StepForm): ProcedureStep {
  const value = form.getRawValue();
  const every = {
    key: value.key,
    text: value.text,
    required: value.required,
    ...(written(value.help) ? { help: value.help } : {}),
    ...(written(value.caution) ? { caution: value.caution } : {}),
    ...(value.component ? { component: value.component } : {}),
    ...(value.cause ? { cause: value.cause } : {}),
    ...(value.severity ? { severity: value.severity } : {}),
  };
  if (value.kind === 'number') {
    const { unit, low, high, limitFrom, basis } = value.number;
    return {
      kind: 'number',
      ...every,
      number: {
        unit,
        ...(low === null ? {} : { low }),
        ...(high === null ? {} : { high }),
        ...(limitFrom ? { limitFrom } : {}),
        ...(written(basis) ? { basis } : {}),
      },
    };
  }
  if (value.kind === 'choice') {
    const choices = value.choices.map(({ key, text, outOfLimit, cause, severity }) => ({
      key,
      text,
      ...(outOfLimit ? { outOfLimit } : {}),
      ...(outOfLimit && cause ? { cause } : {}),
      ...(outOfLimit && severity ? { severity } : {}),
    }));
    return { kind: 'choice', ...every, choices };
  }
  return { kind: value.kind, ...every };
}

const written = ({ en, es }: LocalizedText) => en.trim() !== '' || es.trim() !== '';
