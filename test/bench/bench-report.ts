/** One measured figure of a bench. */
export interface BenchFigure {
  readonly name: string;
  readonly value: number | string | boolean;
  readonly unit?: string;
}

/** What a bench measured, and whether its bar was met. */
export interface BenchReport {
  readonly bench: string;
  readonly bar: string;
  readonly met: boolean;
  readonly figures: readonly BenchFigure[];
}

/** The report as lines for a terminal. */
export function benchTable({ bench, bar, met, figures }: BenchReport): string {
  const width = Math.max(...figures.map(({ name }) => name.length));
  const lines = figures.map(
    ({ name, value, unit }) => `  ${name.padEnd(width)}  ${value}${unit ? ` ${unit}` : ''}`,
  );
  return [`${bench}: ${met ? 'bar met' : 'BAR MISSED'} (${bar})`, ...lines].join('\n');
}
