export type Words = Readonly<Record<'en' | 'es', string>>;

/** What a cell can hold: text, a figure, a yes or no, or nothing. */
export type CellValue = string | number | boolean | null | undefined;

interface ColumnOf<Row, Kind extends string, Value> {
  readonly heading: Words;
  readonly kind: Kind;
  readonly value: (row: Row) => Value | null | undefined;
}

/**
 * One column of a file. `text` takes words in the reader's language as well; `date` is a calendar date
 * (`YYYY-MM-DD`); `instant` is shown as wall clock in the reader's zone, which the heading names.
 */
export type ExportColumn<Row> =
  | ColumnOf<Row, 'text', string | Words>
  | ColumnOf<Row, 'number', number>
  | ColumnOf<Row, 'date', string>
  | ColumnOf<Row, 'instant', Date | string>;

type Value<Row, K extends ExportColumn<Row>['kind']> = Extract<
  ExportColumn<Row>,
  { kind: K }
>['value'];

/** Short forms: `text<StoreRow>({ en: 'City', es: 'Ciudad' }, (row) => row.city)`. */
export const text = <Row>(heading: Words, value: Value<Row, 'text'>): ExportColumn<Row> => ({
  heading,
  kind: 'text',
  value,
});
export const figure = <Row>(heading: Words, value: Value<Row, 'number'>): ExportColumn<Row> => ({
  heading,
  kind: 'number',
  value,
});
export const date = <Row>(heading: Words, value: Value<Row, 'date'>): ExportColumn<Row> => ({
  heading,
  kind: 'date',
  value,
});
export const instant = <Row>(heading: Words, value: Value<Row, 'instant'>): ExportColumn<Row> => ({
  heading,
  kind: 'instant',
  value,
});

/** In whose language and zone a file is written. */
export interface Reader {
  readonly locale: 'en' | 'es';
  /** IANA. */
  readonly timeZone: string;
}

/** The heading as it stands in the file. */
export function headingOf<Row>(column: ExportColumn<Row>, { locale, timeZone }: Reader): string {
  const heading = column.heading[locale];
  return column.kind === 'instant' ? `${heading} (${timeZone})` : heading;
}

/** Wall clock of an instant in a zone, `YYYY-MM-DD HH:MM`. */
export function wallClock(at: Date | string, timeZone: string): string {
  const parts = formatOf(timeZone).formatToParts(new Date(at));
  const part = (type: string) => parts.find((it) => it.type === type)?.value ?? '';
  return `${part('year')}-${part('month')}-${part('day')} ${part('hour')}:${part('minute')}`;
}

const formats = new Map<string, Intl.DateTimeFormat>();

function formatOf(timeZone: string): Intl.DateTimeFormat {
  const known = formats.get(timeZone);
  if (known) return known;
  const made = new Intl.DateTimeFormat('en-US', {
    timeZone,
    year: 'numeric',
    month: '2-digit',
    day: '2-digit',
    hour: '2-digit',
    minute: '2-digit',
    hourCycle: 'h23',
  });
  formats.set(timeZone, made);
  return made;
}
