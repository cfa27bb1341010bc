import { ChangeDetectionStrategy, Component, input, output } from '@angular/core';
import { MatIconButton } from '@angular/material/button';
import { MatMenu, MatMenuItem, MatMenuTrigger } from '@angular/material/menu';
import { Icon } from '../icon/icon';

export interface ColumnOption {
  readonly key: string;
  readonly label: string;
  readonly shown: boolean;
}

/** Chooses which columns a table shows; stays open while one chooses. */
@Component({
  selector: 'vw-column-menu',
  imports: [Icon, MatIconButton, MatMenu, MatMenuItem, MatMenuTrigger],
  template: `
    <button
      matIconButton
      type="button"
      i18n-aria-label="@@ui.table.columns"
      aria-label="Columns"
      [matMenuTriggerFor]="menu"
    >
      <vw-icon name="columns" />
    </button>
    <mat-menu #menu>
      @for (option of options(); track option.key) {
        <button
          mat-menu-item
          type="button"
          role="menuitemcheckbox"
          [attr.aria-checked]="option.shown"
          (click)="toggle($event, option)"
        >
          <span class="line">
            <vw-icon name="check" [class.off]="!option.shown" />{{ option.label }}
          </span>
        </button>
      }
    </mat-menu>
  `,
  styles: `
    .line {
      display: flex;
      align-items: center;
      gap: 10px;
    }
    .off {
      visibility: hidden;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ColumnMenu {
  readonly options = input.required<readonly ColumnOption[]>();

  readonly chosen = output<ColumnOption>();

  protected toggle(event: Event, option: ColumnOption): void {
    event.stopPropagation();
    this.chosen.emit({ ...option, shown: !option.shown });
  }
}
