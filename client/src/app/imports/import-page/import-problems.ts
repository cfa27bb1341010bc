import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import type { ImportField } from '@shared/imports/import-fields';
import { fieldsOf, importFields } from '@shared/imports/import-fields';
import { listAddress } from '../../fleet/list-address';
import { ProblemView } from '../../problems/problem-view';
import { LanguageChoice } from '../../session/language-choice';
import { Cell } from '../../ui/data-table/cell';
import { DataTable } from '../../ui/data-table/data-table';
import { ExportMenu } from '../../ui/data-table/export-menu';
import type { TableColumn } from '../../ui/data-table/table-column';
import { FilterSelect } from '../../ui/filter-bar/filter-select';
import { PageEmpty } from '../../ui/page-states/page-empty';
import { PageLoading } from '../../ui/page-states/page-loading';
import type { Import, ImportProblem } from '../imports-api';
import { ImportsApi } from '../imports-api';

/** What is wrong with the file, by row and column. */
@Component({
  selector: 'vw-import-problems',
  imports: [Cell, DataTable, ExportMenu, FilterSelect, PageEmpty, PageLoading, ProblemView],
  template: `
    <h2 i18n="@@imports.problems">Problems</h2>
    @if (list.error(); as failure) {
      <vw-problem-view [failure]="failure" (again)="list.reload()" />
    } @else {
      <vw-data-table
        tableId="import-problems"
        i18n-caption="@@imports.problems"
        caption="Problems"
        [columns]="columns"
        [rows]="shown()?.rows ?? []"
        [rowId]="id"
        [busy]="list.isLoading()"
        [total]="shown()?.total ?? null"
        [page]="page()"
        [pageSize]="pageSize()"
        (pageChange)="address.turn($event)"
      >
        <div tools class="tools">
          <vw-filter-select
            i18n-label="@@imports.problem.column"
            label="Column"
            [options]="fields()"
            [value]="field()"
            (chosen)="address.ask({ field: $event || null })"
          />
          <vw-export-menu [csv]="csv()" [xlsx]="xlsx()" />
        </div>
        <ng-template vwCell="row" [vwCellRows]="shown()?.rows" let-problem>
          <ng-container i18n="@@imports.problem.row-n">Row {{ problem.row }}</ng-container>
        </ng-template>
        <ng-template vwCell="column" [vwCellRows]="shown()?.rows" let-problem>
          @if (problem.column) {
            <span class="letter">{{ problem.column }}</span>
          }
          {{ problem.heading ?? '–' }}
        </ng-template>
        <div empty>
          @if (list.isLoading()) {
            <vw-page-loading [lines]="3" />
          } @else {
            <vw-page-empty
              icon="check"
              i18n-heading="@@imports.problems-none"
              heading="No problem here"
            />
          }
        </div>
      </vw-data-table>
    }
  `,
  styles: `
    :host {
      display: block;
    }
    h2 {
      margin-bottom: var(--vw-space-2);
    }
    vw-data-table {
      --vw-table-above: 300px;
    }
    .tools {
      display: flex;
      flex-wrap: wrap;
      gap: var(--vw-space-2);
      align-items: center;
    }
    .letter {
      margin-right: 0.4em;
      color: var(--vw-ink-2);
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ImportProblems {
  private readonly api = inject(ImportsApi);
  private readonly language = inject(LanguageChoice).current;
  protected readonly address = listAddress();

  readonly import = input.required<Import>();
  readonly page = input(1);
  readonly pageSize = input(50);
  readonly field = input('');

  protected readonly list = this.api.problems(
    () => this.import().id,
    () => ({
      page: this.page(),
      pageSize: this.pageSize(),
      field: (this.field() as ImportField) || undefined,
    }),
  );
  protected readonly shown = computed(() => (this.list.hasValue() ? this.list.value() : null));
  protected readonly csv = computed(() => this.api.problemsFile(this.import().id, 'csv'));
  protected readonly xlsx = computed(() => this.api.problemsFile(this.import().id, 'xlsx'));
  protected readonly fields = computed(() =>
    fieldsOf[this.import().kind].map((value) => ({
      value,
      label: importFields[value][this.language],
    })),
  );
  protected readonly columns: readonly TableColumn<ImportProblem>[] = [
    { key: 'row', label: $localize`:@@imports.problem.row:Row`, width: '6rem' },
    { key: 'column', label: $localize`:@@imports.problem.column:Column` },
    {
      key: 'value',
      label: $localize`:@@imports.problem.value:What stands there`,
      text: (problem) => problem.value || null,
    },
    {
      key: 'message',
      label: $localize`:@@imports.problem.message:What is wrong`,
      text: (problem) => problem.message,
    },
  ];
  protected readonly id = ({ row, field, reason }: ImportProblem): string =>
    `${row} ${field ?? ''} ${reason}`;
}
