import { countedWindows } from '../compliance/on-time-rate';
import { causeWords } from '../findings/cause';
import type { Block } from '../mail/block';
import {
  formatCents,
  formatCount,
  formatDay,
  formatMonth,
  formatRate,
} from '../mail/format-moment';
import type { Locale } from '../mail/locale';
import { formatChange, formatPoints } from './format-change';
import type { DigestContent } from './digest-content';
import { digestWords } from './digest-words';
import { storesToDecide } from './stores-to-decide';

type Counts = DigestContent['counts'];

/** What the digest is written for: its figures, a language, and the address of the product. */
interface Writing {
  readonly content: DigestContent;
  readonly locale: Locale;
  /** Without a slash at its end; the empty text on the page itself. */
  readonly baseUrl: string;
  /** Tables longer than this are cut and what is left out is counted; the page shows all. */
  readonly mostRows: number;
}

/** The digest as blocks: what the letter and the page both show, in the order of a decision. */
export function digestBlocks(writing: Writing): Block[] {
  return [
    ...headline(writing),
    ...decisions(writing),
    ...months(writing),
    ...stores(writing),
    ...overdue(writing),
    ...findings(writing),
    ...repairs(writing),
    ...closing(writing),
  ];
}

function headline({ content, locale }: Writing): Block[] {
  const its = digestWords[locale];
  const { counts, rate, change } = content;
  const n = (count: number) => formatCount(count, locale);
  const cost = content.repairs.partsCents + content.repairs.labourCents;
  return [
    {
      kind: 'figures',
      figures: [
        { value: formatRate(rate, locale), label: its.onTime, tone: 'plain' },
        {
          value: formatChange(change, locale),
          label: its.change,
          tone: change !== null && change < 0 ? 'alert' : 'plain',
        },
        {
          value: n(content.overdue.count),
          label: its.overdue,
          tone: content.overdue.count > 0 ? 'alert' : 'plain',
        },
        { value: n(content.findings.count), label: its.findings, tone: 'plain' },
        { value: formatCents(cost, locale), label: its.cost, tone: 'plain' },
      ],
    },
    {
      kind: 'paragraph',
      text:
        rate === null
          ? its.noWindows
          : `${its.basis(n(counts.onTime), n(countedWindows(counts)))} ${its.leftOut(n(counts.excused), n(counts.covered))}`,
    },
  ];
}

function decisions({ content, locale, baseUrl }: Writing): Block[] {
  const its = digestWords[locale];
  const stopped = content.stopped.map((it) => ({
    text: its.stopped(
      causeWords[it.cause][locale],
      `${it.number} ${it.name}${it.unitTag ? ` (${it.unitTag})` : ''}`,
      formatDay(it.foundOn, locale),
    ),
    href: `${baseUrl}/findings/${it.findingId}`,
  }));
  const low = storesToDecide(content.stores).map((store) => ({
    text: its.low(
      `${store.number} ${store.name}`,
      formatRate(store.rate, locale),
      ofCounted(store.counts, locale),
    ),
    href: `${baseUrl}/compliance?by=rule&store=${store.storeId}&from=${content.month}&to=${content.month}`,
  }));
  return [
    { kind: 'heading', text: its.decide },
    ...listed(its.stoppedTitle, stopped, locale),
    ...listed(its.lowTitle, low, locale),
    ...(stopped.length + low.length === 0
      ? [{ kind: 'paragraph' as const, text: its.nothingToDecide }]
      : []),
  ];
}

/** Decisions are few or they are none: ten are named and the rest counted. */
const MOST_LINES = 10;

function listed(title: string, lines: { text: string; href: string }[], locale: Locale): Block[] {
  if (lines.length === 0) return [];
  const rest = lines.length - MOST_LINES;
  const more = rest > 0 ? [{ text: digestWords[locale].more(formatCount(rest, locale)) }] : [];
  return [{ kind: 'list', title, lines: [...lines.slice(0, MOST_LINES), ...more] }];
}

function months({ content, locale }: Writing): Block[] {
  const its = digestWords[locale];
  return [
    { kind: 'heading', text: its.months },
    {
      kind: 'table',
      caption: its.monthsCaption,
      columns: rateColumns(its.month, locale),
      rows: content.months.map(({ month, counts, rate }) => [
        formatMonth(month, locale),
        formatRate(rate, locale),
        ofCounted(counts, locale),
        formatCount(counts.late, locale),
        formatCount(counts.notDone, locale),
      ]),
    },
  ];
}

function stores({ content, locale, mostRows }: Writing): Block[] {
  const its = digestWords[locale];
  if (content.stores.length === 0) return [];
  return [
    { kind: 'heading', text: its.stores },
    {
      kind: 'table',
      caption: its.storesCaption,
      columns: [...rateColumns(its.store, locale), { label: its.changeColumn, numeric: true }],
      rows: content.stores
        .slice(0, mostRows)
        .map((store) => [
          `${store.number} ${store.name}`,
          formatRate(store.rate, locale),
          ofCounted(store.counts, locale),
          formatCount(store.counts.late, locale),
          formatCount(store.counts.notDone, locale),
          formatPoints(store.change, locale),
        ]),
    },
    ...rest(content.stores.length - mostRows, locale),
  ];
}

const rateColumns = (first: string, locale: Locale) => {
  const its = digestWords[locale];
  const numeric = (label: string) => ({ label, numeric: true });
  return [
    { label: first, numeric: false },
    numeric(its.rate),
    numeric(its.count),
    numeric(its.late),
    numeric(its.notDone),
  ];
};

function overdue({ content, locale, mostRows }: Writing): Block[] {
  const its = digestWords[locale];
  const all = content.overdue.stores;
  const heading: Block = { kind: 'heading', text: its.overdueTitle };
  if (all.length === 0) return [heading, { kind: 'paragraph', text: its.overdueNone }];
  return [
    heading,
    {
      kind: 'table',
      caption: its.overdueCaption,
      columns: [
        { label: its.store, numeric: false },
        { label: its.count, numeric: true },
        { label: its.oldest, numeric: true },
      ],
      rows: all
        .slice(0, mostRows)
        .map((store) => [
          `${store.number} ${store.name}`,
          formatCount(store.count, locale),
          formatDay(store.oldestClosedOn, locale),
        ]),
    },
    ...rest(all.length - mostRows, locale),
  ];
}

function findings({ content, locale }: Writing): Block[] {
  const its = digestWords[locale];
  const { byCause } = content.findings;
  const heading: Block = { kind: 'heading', text: its.findingsTitle };
  if (byCause.length === 0) return [heading, { kind: 'paragraph', text: its.findingsNone }];
  const numeric = (label: string) => ({ label, numeric: true });
  return [
    heading,
    {
      kind: 'table',
      caption: its.findingsCaption,
      columns: [
        { label: its.cause, numeric: false },
        numeric(its.findingsColumn),
        numeric(its.stop),
        numeric(its.unsettled),
      ],
      rows: byCause.map((it) => [
        causeWords[it.cause][locale],
        formatCount(it.count, locale),
        formatCount(it.stop, locale),
        formatCount(it.unsettled, locale),
      ]),
    },
  ];
}

function repairs({ content, locale }: Writing): Block[] {
  const its = digestWords[locale];
  const { count, partsCents, labourCents } = content.repairs;
  const text =
    count === 0
      ? its.repairsNone
      : its.repairs(
          count,
          formatCount(count, locale),
          formatCents(partsCents, locale),
          formatCents(labourCents, locale),
        );
  return [
    { kind: 'heading', text: its.repairsTitle },
    { kind: 'paragraph', text },
  ];
}

function closing({ locale }: Writing): Block[] {
  const its = digestWords[locale];
  return [
    { kind: 'note', text: its.definition },
    { kind: 'note', text: its.safety },
  ];
}

function rest(count: number, locale: Locale): Block[] {
  if (count <= 0) return [];
  return [{ kind: 'note', text: digestWords[locale].more(formatCount(count, locale)) }];
}

function ofCounted(counts: Counts, locale: Locale): string {
  const n = (count: number) => formatCount(count, locale);
  return digestWords[locale].of(n(counts.onTime), n(countedWindows(counts)));
}
