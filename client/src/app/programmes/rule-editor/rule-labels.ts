import { toProblem } from '../../problems/problem';
import { showInForm } from '../../problems/form-problems';
import type { RuleForm } from './rule-form';

/** The name of each field of a rule by its path, for the summary of what is wrong. */
export function ruleLabels(): Readonly<Record<string, string>> {
  return {
    name: $localize`:@@programmes.rule-name:Name of the rule`,
    procedureId: $localize`:@@programmes.procedure:Procedure`,
    recurrence: $localize`:@@programmes.how-often:How often`,
    'window.before': $localize`:@@programmes.window-before:Opens before it is due`,
    'window.after': $localize`:@@programmes.window-after:On time after it is due`,
    'window.dueSoon': $localize`:@@programmes.window-soon:Due soon before it is due`,
    'window.late': $localize`:@@programmes.window-late:It can be done late for`,
    horizonDays: $localize`:@@programmes.horizon:Days written ahead`,
    rank: $localize`:@@programmes.rank:Rank`,
  };
}

/**
 * Shows a refused rule in its form. The recurrence is one field here, whichever of its parts the
 * server names. Returns what belongs to no field.
 */
export function showRuleFaults(form: RuleForm, failure: unknown): readonly string[] {
  const left = showInForm(form, failure);
  const ofRecurrence = toProblem(failure)
    .errors.filter(({ field }) => field.startsWith('recurrence.'))
    .map(({ message }) => message);
  const [first] = ofRecurrence;
  if (first === undefined) return left;
  const { recurrence } = form.controls;
  recurrence.setErrors({ ...recurrence.errors, server: first });
  recurrence.markAsTouched();
  return left.filter((line) => line !== first);
}
