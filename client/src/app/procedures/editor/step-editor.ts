import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import { toObservable, toSignal } from '@angular/core/rxjs-interop';
import { ReactiveFormsModule } from '@angular/forms';
import { MatButton, MatIconButton } from '@angular/material/button';
import { MatCheckbox } from '@angular/material/checkbox';
import { MatOption } from '@angular/material/core';
import { MatError, MatFormField, MatHint, MatLabel } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { MatSelect } from '@angular/material/select';
import { causes, causeWords, severities, severityWords } from '@shared/findings/cause';
import { componentKinds, stepKinds } from '@shared/procedures/step-kind';
import { map, startWith, switchMap } from 'rxjs';
import { LanguageChoice } from '../../session/language-choice';
import { FieldError } from '../../ui/form/field-error';
import { fieldId } from '../../ui/form/form-faults';
import { Icon } from '../../ui/icon/icon';
import { componentWord, kindWord } from '../procedure-words';
import type { StepForm } from './draft-form';
import { choiceForm } from './draft-form';
import { TextPair } from './text-pair';

/** The fields of one step; which ones there are depends on its kind. */
@Component({
  selector: 'vw-step-editor',
  imports: [
    FieldError,
    Icon,
    MatButton,
    MatCheckbox,
    MatError,
    MatFormField,
    MatHint,
    MatIconButton,
    MatInput,
    MatLabel,
    MatOption,
    MatSelect,
    ReactiveFormsModule,
    TextPair,
  ],
  templateUrl: './step-editor.html',
  styleUrl: './step-editor.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class StepEditor {
  private readonly language = inject(LanguageChoice).current;

  readonly step = input.required<StepForm>();
  /** Path of the step in the form: `content.steps.0`. */
  readonly path = input.required<string>();

  protected readonly kind = toSignal(
    toObservable(this.step).pipe(
      switchMap(({ controls: { kind } }) =>
        kind.valueChanges.pipe(
          startWith(null),
          map(() => kind.value),
        ),
      ),
    ),
  );
  /** Words and pictures are not judged. */
  protected readonly judged = computed(() =>
    ['check', 'number', 'choice'].includes(this.kind() ?? ''),
  );

  protected readonly kinds = stepKinds.map((kind) => ({ kind, word: kindWord(kind) }));
  protected readonly components = componentKinds.map((kind) => ({
    kind,
    word: componentWord(kind),
  }));
  protected readonly causes = causes.map((cause) => ({
    cause,
    word: causeWords[cause][this.language],
  }));
  protected readonly severities = severities.map((severity) => ({
    severity,
    word: severityWords[severity][this.language],
  }));
  protected readonly labels = {
    text: $localize`:@@procedures.field.text:Text`,
    help: $localize`:@@procedures.field.help:Help`,
    caution: $localize`:@@procedures.field.caution:Caution`,
    basis: $localize`:@@procedures.field.basis:Where the limit comes from`,
    answer: $localize`:@@procedures.field.answer:Answer`,
  };

  protected id(name: string): string {
    return fieldId(`${this.path()}.${name}`);
  }

  protected addChoice(): void {
    this.step().controls.choices.push(choiceForm());
    this.step().markAsDirty();
  }

  protected removeChoice(index: number): void {
    this.step().controls.choices.removeAt(index);
    this.step().markAsDirty();
  }

  protected removeLabel(index: number): string {
    return $localize`:@@procedures.remove-item:Remove ${this.labels.answer}:name: ${index + 1}:number:`;
  }
}
