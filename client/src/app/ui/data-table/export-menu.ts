import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatMenu, MatMenuItem, MatMenuTrigger } from '@angular/material/menu';
import { Icon } from '../icon/icon';

/** Takes the table away as a file; the addresses carry the filters now set. */
@Component({
  selector: 'vw-export-menu',
  imports: [Icon, MatButton, MatMenu, MatMenuItem, MatMenuTrigger],
  template: `
    <button matButton type="button" [matMenuTriggerFor]="menu">
      <span class="line"
        ><vw-icon name="download" /><span i18n="@@ui.table.export">Export</span></span
      >
    </button>
    <mat-menu #menu>
      <a mat-menu-item [href]="csv()" download i18n="@@ui.table.export-csv">CSV file</a>
      <a mat-menu-item [href]="xlsx()" download i18n="@@ui.table.export-xlsx">Excel file</a>
    </mat-menu>
  `,
  styles: `
    .line {
      display: inline-flex;
      align-items: center;
      gap: 6px;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ExportMenu {
  readonly csv = input.required<string>();
  readonly xlsx = input.required<string>();
}
