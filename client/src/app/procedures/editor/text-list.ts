import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import type { FormArray } from '@angular/forms';
import { MatButton, MatIconButton } from '@angular/material/button';
import { Icon } from '../../ui/icon/icon';
import type { TextPairForm } from './draft-form';
import { textPair } from './draft-form';
import { TextPair } from './text-pair';

/** A list of texts in both languages, to which one can add and from which one can remove. */
@Component({
  selector: 'vw-text-list',
  imports: [Icon, MatButton, MatIconButton, TextPair],
  template: `
    <h2>{{ heading() }}</h2>
    @for (pair of list().controls; track pair; let index = $index) {
      <div class="item">
        <vw-text-pair
          [pair]="pair"
          [label]="label()"
          [path]="path() + '.' + index"
          [longest]="longest()"
        />
        <button
          matIconButton
          type="button"
          [attr.aria-label]="removeLabel(index)"
          (click)="remove(index)"
        >
          <vw-icon name="trash" />
        </button>
      </div>
    }
    <button matButton type="button" (click)="add()">{{ addLabel() }}</button>
  `,
  styles: `
    :host {
      display: grid;
      gap: var(--vw-space-2);
      justify-items: start;
    }
    h2 {
      font-size: 1rem;
    }
    .item {
      display: grid;
      grid-template-columns: minmax(0, 1fr) auto;
      gap: var(--vw-space-2);
      align-items: start;
      width: 100%;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class TextList {
  readonly list = input.required<FormArray<TextPairForm>>();
  readonly heading = input.required<string>();
  /** The name of one of them. */
  readonly label = input.required<string>();
  readonly addLabel = input.required<string>();
  readonly path = input.required<string>();
  readonly longest = input(120);

  protected add(): void {
    this.list().push(textPair());
    this.list().markAsDirty();
  }

  protected remove(index: number): void {
    this.list().removeAt(index);
    this.list().markAsDirty();
  }

  protected removeLabel(index: number): string {
    return $localize`:@@procedures.remove-item:Remove ${this.label()}:name: ${index + 1}:number:`;
  }
}
