import type { ElementRef } from '@angular/core';
import {
  afterRenderEffect,
  ChangeDetectionStrategy,
  Component,
  computed,
  DOCUMENT,
  inject,
  input,
  viewChild,
} from '@angular/core';
import { toObservable, toSignal } from '@angular/core/rxjs-interop';
import type { AbstractControl } from '@angular/forms';
import { map, startWith, switchMap } from 'rxjs';
import { Icon } from '../icon/icon';
import { fieldId, formFaults } from './form-faults';

/**
 * All faults of a form, at its top, each a link to its field. Shown after a try to send
 * (`[tries]` counts them); the focus moves to it then. Inputs need `id` = `fieldId(path)`.
 */
@Component({
  selector: 'vw-problem-summary',
  imports: [Icon],
  templateUrl: './problem-summary.html',
  styleUrl: './problem-summary.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ProblemSummary {
  private readonly document = inject(DOCUMENT);

  readonly form = input.required<AbstractControl>();
  /** Label of each field by its path. */
  readonly labels = input<Readonly<Record<string, string>>>({});
  /** What went wrong apart from single fields. */
  readonly general = input<readonly string[]>([]);
  /** How often sending was tried; 0 keeps the summary away. */
  readonly tries = input.required<number>();

  private readonly box = viewChild<ElementRef<HTMLElement>>('box');
  private readonly now = toSignal(
    toObservable(this.form).pipe(
      switchMap((form) =>
        form.events.pipe(
          startWith(null),
          map(() => formFaults(form)),
        ),
      ),
    ),
  );

  protected readonly faults = computed(() =>
    (this.now() ?? []).map((fault) => ({ ...fault, label: this.labels()[fault.path] ?? '' })),
  );
  protected readonly shown = computed(
    () => this.tries() > 0 && this.faults().length + this.general().length > 0,
  );

  constructor() {
    let told = 0;
    afterRenderEffect(() => {
      const tries = this.tries();
      const box = this.box();
      if (tries > told && box) {
        told = tries;
        box.nativeElement.focus();
      }
    });
  }

  protected lead(event: Event, path: string): void {
    event.preventDefault();
    this.document.getElementById(fieldId(path))?.focus();
  }
}
