import type { TableColumn } from '../../ui/data-table/table-column';
import type { ComplianceRow, Grouping } from '../compliance-api';
import type { ComplianceWords } from '../compliance-words';
import type { WindowEnd } from '../tasks-behind';

/** The word over the counts of windows that ended so. */
export function endWord(end: WindowEnd): string {
  switch (end) {
    case 'onTime':
      return $localize`:@@compliance.end.on-time:On time`;
    case 'late':
      return $localize`:@@compliance.end.late:Done late`;
    case 'notDone':
      return $localize`:@@compliance.end.not-done:Not done`;
    case 'excused':
      return $localize`:@@compliance.end.excused:Excused`;
    case 'covered':
      return $localize`:@@compliance.end.covered:Covered`;
  }
}

/** The columns of the table; a rule also shows the window that its rate hangs on. */
export function complianceColumns(
  by: Grouping,
  words: ComplianceWords,
): readonly TableColumn<ComplianceRow>[] {
  const end = (key: WindowEnd, more: object = {}): TableColumn<ComplianceRow> => ({
    key,
    label: endWord(key),
    align: 'end',
    choice: 'on',
    ...more,
  });
  return [
    { key: 'name', label: words.grouping(by), sort: 'name' },
    ...(by === 'rule'
      ? [
          {
            key: 'window',
            label: $localize`:@@compliance.col.window:Window`,
            choice: 'on' as const,
            text: (row: ComplianceRow) => row.window && words.window(row.window),
          },
        ]
      : []),
    {
      key: 'rate',
      label: $localize`:@@compliance.col.rate:On-time rate`,
      sort: 'rate',
      align: 'end',
      phone: 'aside',
    },
    { key: 'of', label: $localize`:@@compliance.col.of:On time, of counted`, align: 'end' },
    {
      key: 'change',
      label: $localize`:@@compliance.col.change:Change, points`,
      sort: 'change',
      align: 'end',
    },
    {
      key: 'before',
      label: $localize`:@@compliance.col.before:Range before`,
      align: 'end',
      choice: 'on',
    },
    end('late'),
    end('notDone', { sort: 'notDone' }),
    end('excused'),
    end('covered'),
  ];
}
