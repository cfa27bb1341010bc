import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { toObservable, toSignal } from '@angular/core/rxjs-interop';
import type { AbstractControl } from '@angular/forms';
import { map, startWith, switchMap } from 'rxjs';
import { controlWords } from './control-words';

/**
 * What is wrong with a control, in words. Put it inside `<mat-error>`:
 * `<mat-error><vw-field-error [control]="form.controls.name" /></mat-error>`.
 */
@Component({
  selector: 'vw-field-error',
  template: '{{ words() }}',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class FieldError {
  readonly control = input.required<AbstractControl>();

  private readonly errors = toSignal(
    toObservable(this.control).pipe(
      switchMap((control) =>
        control.events.pipe(
          startWith(null),
          map(() => control.errors),
        ),
      ),
    ),
  );
  protected readonly words = computed(() => controlWords(this.errors() ?? null));
}
