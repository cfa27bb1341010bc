import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { toObservable, toSignal } from '@angular/core/rxjs-interop';
import { ReactiveFormsModule } from '@angular/forms';
import { MatOption } from '@angular/material/core';
import { MatError, MatFormField, MatHint, MatLabel } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { MatSelect } from '@angular/material/select';
import type { Recurrence } from '@shared/programmes/recurrence-set';
import { map, startWith, switchMap } from 'rxjs';
import { FieldError } from '../../ui/form/field-error';
import { audienceWord, pumpFaceWord, unitKindWord } from '../programme-words';
import type { ProcedureChoice } from '../programmes-api';
import { RecurrenceEditor } from '../recurrence-editor/recurrence-editor';
import type { RuleForm } from './rule-form';
import { WindowFields } from './window-fields';

/** The fields of a rule: what is done by whom on what, how often, within which window. */
@Component({
  selector: 'vw-rule-fields',
  imports: [
    FieldError,
    MatError,
    MatFormField,
    MatHint,
    MatInput,
    MatLabel,
    MatOption,
    MatSelect,
    ReactiveFormsModule,
    RecurrenceEditor,
    WindowFields,
  ],
  templateUrl: './rule-fields.html',
  styleUrl: './rule-fields.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class RuleFields {
  readonly form = input.required<RuleForm>();
  readonly procedures = input.required<readonly ProcedureChoice[]>();
  /** Titles of procedures by id. */
  readonly titles = input.required<ReadonlyMap<string, string>>();

  private readonly value = toSignal(
    toObservable(this.form).pipe(
      switchMap((form) =>
        form.valueChanges.pipe(
          startWith(null),
          map(() => form.getRawValue()),
        ),
      ),
    ),
  );
  private readonly now = computed(() => this.value() ?? this.form().getRawValue());
  protected readonly recurrence = computed(() => this.now().recurrence);
  protected readonly dueTime = computed(() => this.recurrence().startsLocal.slice(11, 16));
  protected readonly forStores = computed(() => this.now().appliesTo === 'store');
  /** What can be chosen: what is published and in use, and what the rule has now. */
  protected readonly choices = computed(() => {
    const own = this.now().procedureId;
    const usable = this.procedures().filter(
      ({ id, published, retiredAt }) => id !== own && published !== null && retiredAt === null,
    );
    const ids = [...(own ? [own] : []), ...usable.map(({ id }) => id)];
    return ids
      .map((id) => ({ id, title: this.titles().get(id) ?? '' }))
      .sort((a, b) => a.title.localeCompare(b.title));
  });

  protected readonly audiences = (['technician', 'store'] as const).map((value) => ({
    value,
    word: audienceWord(value),
  }));
  protected readonly unitKinds = (['built-in', 'portable'] as const).map((value) => ({
    value,
    word: unitKindWord(value),
  }));
  protected readonly pumpFaces = (['drain-slot', 'gasket'] as const).map((value) => ({
    value,
    word: pumpFaceWord(value),
  }));

  protected changeRecurrence(recurrence: Recurrence): void {
    const { recurrence: control } = this.form().controls;
    control.setValue(recurrence);
    control.markAsDirty();
  }
}
