import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { toObservable, toSignal } from '@angular/core/rxjs-interop';
import { ReactiveFormsModule } from '@angular/forms';
import { MatCheckbox } from '@angular/material/checkbox';
import { MatOption } from '@angular/material/core';
import { MatError, MatFormField, MatLabel, MatSuffix } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { MatSelect } from '@angular/material/select';
import { map, startWith, switchMap } from 'rxjs';
import { FieldError } from '../../ui/form/field-error';
import { WindowPicture } from '../window-picture/window-picture';
import type { RuleForm } from './rule-form';
import { windowOf } from './rule-form';

/** How long around its due time a task may be done, with the picture of it. */
@Component({
  selector: 'vw-window-fields',
  imports: [
    FieldError,
    MatCheckbox,
    MatError,
    MatFormField,
    MatInput,
    MatLabel,
    MatOption,
    MatSelect,
    MatSuffix,
    ReactiveFormsModule,
    WindowPicture,
  ],
  template: `
    <div class="fields" [formGroup]="window()">
      <mat-form-field appearance="outline" subscriptSizing="dynamic">
        <mat-label i18n="@@programmes.window-kind">Counted in</mat-label>
        <mat-select formControlName="kind">
          <mat-option value="days" i18n="@@programmes.window-kind.days">calendar days</mat-option>
          <mat-option value="hours" i18n="@@programmes.window-kind.hours">hours</mat-option>
        </mat-select>
      </mat-form-field>
      @for (field of fields; track field.name) {
        <mat-form-field appearance="outline" subscriptSizing="dynamic">
          <mat-label>{{ field.label }}</mat-label>
          <input
            matInput
            type="number"
            inputmode="numeric"
            min="0"
            max="720"
            [id]="'field-window-' + field.name"
            [formControlName]="field.name"
          />
          <span matTextSuffix>{{ unit() }}</span>
          <mat-error><vw-field-error [control]="window().controls[field.name]" /></mat-error>
        </mat-form-field>
      }
      <div class="late">
        <mat-checkbox formControlName="untilNext">
          <ng-container i18n="@@programmes.late-until-next"
            >It can be done late until the next one opens</ng-container
          >
        </mat-checkbox>
        @if (!plan().untilNext) {
          <mat-form-field appearance="outline" subscriptSizing="dynamic">
            <mat-label i18n="@@programmes.window-late">It can be done late for</mat-label>
            <input
              matInput
              type="number"
              inputmode="numeric"
              min="0"
              max="720"
              id="field-window-late"
              formControlName="late"
            />
            <span matTextSuffix>{{ unit() }}</span>
            <mat-error><vw-field-error [control]="window().controls.late" /></mat-error>
          </mat-form-field>
        }
      </div>
    </div>
    <vw-window-picture [plan]="plan().window" [dueTime]="dueTime()" />
  `,
  styles: `
    :host {
      display: grid;
      gap: var(--vw-space-4);
    }
    .fields {
      display: grid;
      grid-template-columns: repeat(auto-fill, minmax(11.5rem, 1fr));
      gap: var(--vw-space-3);
      align-items: start;
    }
    .late {
      display: flex;
      flex-wrap: wrap;
      gap: var(--vw-space-2) var(--vw-space-3);
      align-items: center;
      grid-column: 1 / -1;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class WindowFields {
  readonly window = input.required<RuleForm['controls']['window']>();
  /** Time of day at which it is due, HH:MM. */
  readonly dueTime = input.required<string>();

  protected readonly fields = [
    { name: 'before', label: $localize`:@@programmes.window-before:Opens before it is due` },
    { name: 'after', label: $localize`:@@programmes.window-after:On time after it is due` },
    { name: 'dueSoon', label: $localize`:@@programmes.window-soon:Due soon before it is due` },
  ] as const;

  private readonly value = toSignal(
    toObservable(this.window).pipe(
      switchMap((form) =>
        form.valueChanges.pipe(
          startWith(null),
          map(() => form.getRawValue()),
        ),
      ),
    ),
  );
  protected readonly plan = computed(() => {
    const value = this.value() ?? this.window().getRawValue();
    return { window: windowOf(value), untilNext: value.untilNext };
  });
  protected readonly unit = computed(() =>
    this.plan().window.kind === 'days'
      ? $localize`:@@programmes.days:days`
      : $localize`:@@programmes.hours:hours`,
  );
}
