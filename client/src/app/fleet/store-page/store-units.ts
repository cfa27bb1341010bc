import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { RouterLink } from '@angular/router';
import { unitKindWords } from '@shared/fleet/fleet-words';
import { ProblemView } from '../../problems/problem-view';
import { LanguageChoice } from '../../session/language-choice';
import { Cell } from '../../ui/data-table/cell';
import { DataTable } from '../../ui/data-table/data-table';
import type { TableColumn } from '../../ui/data-table/table-column';
import { PageEmpty } from '../../ui/page-states/page-empty';
import { PageLoading } from '../../ui/page-states/page-loading';
import { TimeInZonePipe } from '../../ui/text/time-in-zone-pipe';
import { DayPipe } from '../day-pipe';
import type { Store } from '../fleet-api';
import type { UnitRow } from '../unit-api';
import { UnitApi } from '../unit-api';

/** The units of a store. */
@Component({
  selector: 'vw-store-units',
  imports: [
    Cell,
    DataTable,
    DayPipe,
    MatButton,
    PageEmpty,
    PageLoading,
    ProblemView,
    RouterLink,
    TimeInZonePipe,
  ],
  template: `
    <section>
      <div class="head">
        <h2 i18n="@@fleet.units">Units</h2>
        @if (store().mayEdit && !store().retiredAt) {
          <a
            matButton
            routerLink="/fleet/units/new"
            [queryParams]="{ store: store().id }"
            i18n="@@fleet.add-unit"
            >Add a unit</a
          >
        }
      </div>
      @if (list.error(); as failure) {
        <vw-problem-view [failure]="failure" (again)="list.reload()" />
      } @else {
        <vw-data-table
          tableId="store-units"
          i18n-caption="@@fleet.units"
          caption="Units"
          [columns]="columns"
          [rows]="rows()"
          [rowId]="id"
          [rowLink]="link"
          [busy]="list.isLoading()"
        >
          <ng-template vwCell="tag" [vwCellRows]="rows()" let-row>
            {{ row.tag }}
            @if (row.retiredAt) {
              <span class="mark" i18n="@@fleet.mark.retired">retired</span>
            } @else if (row.outOfServiceSince) {
              <span class="mark out" i18n="@@fleet.mark.out">out of service</span>
            }
          </ng-template>
          <ng-template vwCell="pump" [vwCellRows]="rows()" let-row>{{
            row.pumpInstalledOn | day
          }}</ng-template>
          <ng-template vwCell="inspected" [vwCellRows]="rows()" let-row>{{
            row.lastInspectedAt | timeInZone: row.timeZone : 'date'
          }}</ng-template>
          <ng-template vwCell="findings" [vwCellRows]="rows()" let-row>
            <span [class.some]="row.openFindings > 0">{{ row.openFindings }}</span>
          </ng-template>
          <div empty>
            @if (list.isLoading()) {
              <vw-page-loading [lines]="3" />
            } @else {
              <vw-page-empty
                icon="unit"
                i18n-heading="@@fleet.no-units-here"
                heading="No units here yet"
                i18n-advice="@@fleet.no-units-here-advice"
                advice="Add the filtration systems that stand behind the fryer line, with their pump and motor."
              />
            }
          </div>
        </vw-data-table>
      }
    </section>
  `,
  styleUrl: '../fleet-list.scss',
  styles: `
    vw-data-table {
      --vw-table-above: 200px;
    }
    .head {
      display: flex;
      align-items: center;
      justify-content: space-between;
      min-height: 44px;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class StoreUnits {
  private readonly language = inject(LanguageChoice).current;

  readonly store = input.required<Store>();

  protected readonly list = inject(UnitApi).units(() => ({
    store: this.store().id,
    state: 'all',
    sort: 'tag',
    pageSize: 200,
  }));
  /** Those in use first. */
  protected readonly rows = computed(() => {
    const rows = this.list.hasValue() ? this.list.value().rows : [];
    return [...rows.filter((row) => !row.retiredAt), ...rows.filter((row) => row.retiredAt)];
  });
  protected readonly columns: readonly TableColumn<UnitRow>[] = [
    { key: 'tag', label: $localize`:@@fleet.unit:Unit` },
    {
      key: 'kind',
      label: $localize`:@@fleet.kind:Kind`,
      text: (row) => unitKindWords[row.kind][this.language],
    },
    { key: 'vats', label: $localize`:@@fleet.vats:Vats`, align: 'end', text: (row) => row.vats },
    { key: 'pump', label: $localize`:@@fleet.pump-since:Pump since` },
    { key: 'inspected', label: $localize`:@@fleet.last-inspected:Last inspected` },
    {
      key: 'findings',
      label: $localize`:@@fleet.open-findings:Open findings`,
      align: 'end',
    },
  ];
  protected readonly id = (row: UnitRow): string => row.id;
  protected readonly link = (row: UnitRow): readonly unknown[] => ['/fleet/units', row.id];
}
