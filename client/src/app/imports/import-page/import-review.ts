import { DecimalPipe } from '@angular/common';
import {
  ChangeDetectionStrategy,
  Component,
  computed,
  input,
  linkedSignal,
  output,
} from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatRadioButton, MatRadioGroup } from '@angular/material/radio';
import { Icon } from '../../ui/icon/icon';
import type { Import, ImportMode } from '../imports-api';
import { OutcomeTable } from './outcome-table';

/** What would be taken in, and the choice between everything and the good rows. */
@Component({
  selector: 'vw-import-review',
  imports: [DecimalPipe, Icon, MatButton, MatRadioButton, MatRadioGroup, OutcomeTable],
  templateUrl: './import-review.html',
  styles: `
    .panel {
      display: grid;
      gap: var(--vw-space-4);
      max-width: 46rem;
      padding: var(--vw-space-4);
    }
    .line {
      display: flex;
      gap: var(--vw-space-2);
      align-items: flex-start;
    }
    .bad {
      color: var(--vw-vermilion);
    }
    .good {
      color: var(--vw-kelp);
    }
    mat-radio-group {
      display: grid;
    }
    .names {
      overflow-wrap: anywhere;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ImportReview {
  readonly import = input.required<Import>();
  readonly busy = input(false);

  readonly started = output<ImportMode>();
  readonly columnsAsked = output();

  protected readonly outcome = computed(() => this.import().checked);
  protected readonly clean = computed(() => this.outcome()?.badRows === 0);
  protected readonly mode = linkedSignal<ImportMode>(() =>
    this.clean() ? 'all-or-nothing' : 'good-rows',
  );

  protected start(): void {
    this.started.emit(this.mode());
  }
}
