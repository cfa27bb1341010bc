import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import type { FormArray } from '@angular/forms';
import { ReactiveFormsModule } from '@angular/forms';
import { MatButton, MatIconButton } from '@angular/material/button';
import { MatFormField, MatLabel } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { FieldError } from '../../ui/form/field-error';
import { fieldId } from '../../ui/form/form-faults';
import { Icon } from '../../ui/icon/icon';
import type { RushForm } from './store-form-model';
import { rushForm } from './store-form-model';

/** When nobody may work on the line: windows of a day, each from and to. */
@Component({
  selector: 'vw-rush-list',
  imports: [
    FieldError,
    Icon,
    MatButton,
    MatFormField,
    MatIconButton,
    MatInput,
    MatLabel,
    ReactiveFormsModule,
  ],
  template: `
    @for (rush of rushes().controls; track rush; let index = $index) {
      <div class="line" [formGroup]="rush">
        <mat-form-field appearance="outline" subscriptSizing="dynamic">
          <mat-label i18n="@@fleet.rush-from">No work from</mat-label>
          <input matInput type="time" formControlName="from" [id]="id(index, 'from')" />
        </mat-form-field>
        <mat-form-field appearance="outline" subscriptSizing="dynamic">
          <mat-label i18n="@@fleet.rush-to">until</mat-label>
          <input matInput type="time" formControlName="to" [id]="id(index, 'to')" />
        </mat-form-field>
        <button
          matIconButton
          type="button"
          i18n-aria-label="@@fleet.rush-remove"
          aria-label="Take this window away"
          (click)="remove(index)"
        >
          <vw-icon name="trash" />
        </button>
        @if (rush.invalid && (rush.touched || rush.dirty)) {
          <p class="fault">
            @if (rush.errors) {
              <vw-field-error [control]="rush" />
            } @else if (rush.controls.from.errors) {
              <vw-field-error [control]="rush.controls.from" />
            } @else {
              <vw-field-error [control]="rush.controls.to" />
            }
          </p>
        }
      </div>
    }
    @if (rushes().length < 6) {
      <button matButton type="button" (click)="add()" i18n="@@fleet.rush-add">
        Add a rush window
      </button>
    }
  `,
  styles: `
    .line {
      display: grid;
      grid-template-columns: 9.5rem 9.5rem auto;
      gap: var(--vw-space-2);
      align-items: center;
      justify-content: start;
      margin-bottom: var(--vw-space-3);
    }
    .fault {
      grid-column: 1 / -1;
      color: var(--vw-vermilion);
      font-size: var(--vw-text-tiny);
    }
    @media (width < 480px) {
      .line {
        grid-template-columns: 1fr 1fr auto;
      }
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class RushList {
  readonly rushes = input.required<FormArray<RushForm>>();
  /** Path of the list in the form, for the ids of its fields. */
  readonly path = input.required<string>();

  protected id(index: number, name: string): string {
    return fieldId(`${this.path()}.${index}.${name}`);
  }

  protected add(): void {
    this.rushes().push(rushForm());
    this.rushes().markAsDirty();
  }

  protected remove(index: number): void {
    this.rushes().removeAt(index);
    this.rushes().markAsDirty();
  }
}
