import type { AbstractControl, ValidationErrors } from '@angular/forms';
import { FormControl, FormGroup, Validators } from '@angular/forms';
import { recurrenceProblems } from '@shared/programmes/recurrence-problems';
import type { Recurrence } from '@shared/programmes/recurrence-set';
import type { RuleDefinition } from '@shared/programmes/rule-definition';
import { recurrenceProblemWords } from '../recurrence-editor/problem-words';

const control = <T>(value: T) => new FormControl(value, { nonNullable: true });
const whole = (value: number, least: number, most: number) =>
  new FormControl<number | null>(value, [
    Validators.required,
    Validators.min(least),
    Validators.max(most),
    Validators.pattern(/^\d+$/),
  ]);

/** What a new rule begins with: a monthly inspection by a technician, due at nine. */
export function newDefinition(today: string): RuleDefinition {
  return {
    procedureId: '',
    name: '',
    audience: 'technician',
    appliesTo: 'unit',
    unitKind: null,
    pumpFace: null,
    recurrence: {
      startsLocal: `${today}T09:00:00`,
      rrules: [`FREQ=MONTHLY;BYMONTHDAY=${Math.min(Number(today.slice(8, 10)), 28)}`],
      rdates: [],
      exdates: [],
    },
    window: { kind: 'days', before: 3, after: 3, late: null, dueSoon: 3 },
    horizonDays: 90,
    rank: 0,
  };
}

/** The form of a rule, laid out like its definition so that faults find their fields. */
export function ruleForm(rule: RuleDefinition) {
  const { window } = rule;
  const form = new FormGroup({
    name: new FormControl(rule.name, {
      nonNullable: true,
      validators: [Validators.required, Validators.pattern(/\S/), Validators.maxLength(120)],
    }),
    procedureId: new FormControl(rule.procedureId, {
      nonNullable: true,
      validators: [Validators.required],
    }),
    audience: control(rule.audience),
    appliesTo: control(rule.appliesTo),
    /** Empty for any; a select shows no word for null. */
    unitKind: control<NonNullable<RuleDefinition['unitKind']> | ''>(rule.unitKind ?? ''),
    pumpFace: control<NonNullable<RuleDefinition['pumpFace']> | ''>(rule.pumpFace ?? ''),
    recurrence: new FormControl<Recurrence>(rule.recurrence, {
      nonNullable: true,
      validators: [canBeUsed],
    }),
    window: new FormGroup({
      kind: control(window.kind),
      before: whole(window.before, 0, 720),
      after: whole(window.after, 0, 720),
      dueSoon: whole(window.dueSoon, 0, 720),
      /** Whether it stays late until the next one opens; then the number beside it is idle. */
      untilNext: control(window.late === null),
      late: whole(window.late ?? 3, 0, 720),
    }),
    horizonDays: whole(rule.horizonDays, 1, 400),
    rank: whole(rule.rank, 0, 100),
  });
  const { untilNext, late } = form.controls.window.controls;
  // An idle field must not keep the form from being sent.
  const idle = (is: boolean) => (is ? late.disable() : late.enable());
  idle(untilNext.value);
  untilNext.valueChanges.subscribe(idle);
  return form;
}

export type RuleForm = ReturnType<typeof ruleForm>;

/** The definition that a form holds; to be asked of a valid form. */
export function definitionOf(form: RuleForm): RuleDefinition {
  const { window, name, unitKind, pumpFace, horizonDays, rank, ...rest } = form.getRawValue();
  return {
    ...rest,
    name: name.trim(),
    unitKind: unitKind || null,
    pumpFace: pumpFace || null,
    window: windowOf(window),
    horizonDays: horizonDays ?? 1,
    rank: rank ?? 0,
  };
}

/** The window that the form holds, what is empty counted as none. */
export function windowOf({
  untilNext,
  kind,
  before,
  after,
  late,
  dueSoon,
}: ReturnType<RuleForm['controls']['window']['getRawValue']>): RuleDefinition['window'] {
  return {
    kind,
    before: before ?? 0,
    after: after ?? 0,
    late: untilNext ? null : (late ?? 0),
    dueSoon: dueSoon ?? 0,
  };
}

/** Refuses what the server would refuse, in the same words that stand beside the recurrence. */
function canBeUsed({ value }: AbstractControl<Recurrence>): ValidationErrors | null {
  const [problem] = recurrenceProblems(value);
  return problem ? { words: recurrenceProblemWords(problem) } : null;
}
