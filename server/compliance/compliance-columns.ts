import { countedWindows, type WindowCounts } from '@shared/compliance/on-time-rate';
import type { ComplianceQuery } from './compliance-table';
import type { ReplyOf } from '@shared/contract/endpoint';
import type { readCompliance } from '@shared/compliance/compliance-contract';
import { type ExportColumn, figure, text, type Words } from '../exports/export-column';

type Row = ReplyOf<typeof readCompliance>['rows'][number];

const names: Readonly<Record<ComplianceQuery['by'], Words>> = {
  store: { en: 'Store', es: 'Tienda' },
  region: { en: 'Region', es: 'Región' },
  chain: { en: 'Chain', es: 'Cadena' },
  rule: { en: 'Rule', es: 'Regla' },
};

/** Rates go out as shares from 0 to 1, not rounded, so that a sheet can calculate with them. */
const counts = (of: (row: Row) => WindowCounts, after: Words): ExportColumn<Row>[] => {
  const heading = (en: string, es: string) => ({ en: en + after.en, es: es + after.es });
  return [
    figure(heading('On time', 'A tiempo'), (row) => of(row).onTime),
    figure(heading('Done late', 'Hechas tarde'), (row) => of(row).late),
    figure(heading('Not done', 'No hechas'), (row) => of(row).notDone),
    figure(heading('Counted', 'Contadas'), (row) => countedWindows(of(row))),
    figure(heading('Excused', 'Dispensadas'), (row) => of(row).excused),
    figure(heading('Covered', 'Cubiertas'), (row) => of(row).covered),
  ];
};

/** The columns of the file, as of the table on screen, with every count spelled out. */
export function complianceColumns(by: ComplianceQuery['by']): ExportColumn<Row>[] {
  const before = { en: ', range before', es: ', periodo anterior' };
  return [
    ...(by === 'store' ? [text<Row>({ en: 'Number', es: 'Número' }, (row) => row.number)] : []),
    text(names[by], (row) => row.name),
    figure({ en: 'On-time rate', es: 'Porcentaje a tiempo' }, (row) => row.rate),
    figure({ en: 'Change in points', es: 'Cambio en puntos' }, (row) => row.change),
    ...counts((row) => row.counts, { en: '', es: '' }),
    figure(
      { en: 'On-time rate, range before', es: 'Porcentaje a tiempo, periodo anterior' },
      (row) => row.previousRate,
    ),
    ...counts((row) => row.previousCounts, before),
  ];
}
