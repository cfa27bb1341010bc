import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { importKindWord } from '../import-words';
import type { ImportOutcome } from '../imports-api';

const sorts = ['chains', 'regions', 'stores', 'units', 'components'] as const;

/** How many of each sort of thing are made, changed, or known already as they stand. */
@Component({
  selector: 'vw-outcome-table',
  template: `
    <table>
      <thead>
        <tr>
          <th scope="col"><span class="vw-hidden" i18n="@@imports.outcome.what">What</span></th>
          <th scope="col" i18n="@@imports.outcome.made">New</th>
          <th scope="col" i18n="@@imports.outcome.changed">Changed</th>
          <th scope="col" i18n="@@imports.outcome.same">As known</th>
        </tr>
      </thead>
      <tbody>
        @for (row of rows(); track row.sort) {
          <tr>
            <th scope="row">{{ row.word }}</th>
            <td>{{ row.made }}</td>
            <td>{{ row.changed }}</td>
            <td>{{ row.same }}</td>
          </tr>
        } @empty {
          <tr>
            <td colspan="4" i18n="@@imports.outcome.none">No row can be taken in.</td>
          </tr>
        }
      </tbody>
    </table>
  `,
  styles: `
    table {
      border-collapse: collapse;
    }
    th,
    td {
      padding: 6px var(--vw-space-4) 6px 0;
      border-bottom: 1px solid var(--vw-line);
      text-align: end;
    }
    th:first-child {
      text-align: start;
    }
    thead th {
      color: var(--vw-ink-2);
      font-size: var(--vw-text-tiny);
    }
    tr:last-child > * {
      border-bottom: 0;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class OutcomeTable {
  readonly outcome = input.required<ImportOutcome>();

  protected readonly rows = computed(() =>
    sorts
      .map((sort) => ({ sort, word: importKindWord(sort), ...this.outcome()[sort] }))
      .filter(({ made, changed, same }) => made + changed + same > 0),
  );
}
