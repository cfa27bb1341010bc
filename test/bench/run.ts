// `npm run bench -- NAME [--json]`: measures one part of the product against its bar.
import { type BenchReport, benchTable } from './bench-report';
import { benchGeneration } from './generation';
import { benchImport } from './import';
import { benchLists } from './lists';
import { benchRecurrence } from './recurrence';

const BENCHES: Readonly<
  Record<string, (args: readonly string[]) => BenchReport | Promise<BenchReport>>
> = {
  generation: benchGeneration,
  import: benchImport,
  lists: benchLists,
  recurrence: benchRecurrence,
};

async function main(args: readonly string[]): Promise<number> {
  const name = args.find((arg) => !arg.startsWith('--'));
  const bench = name === undefined ? undefined : BENCHES[name];
  if (!bench) {
    const names = Object.keys(BENCHES).join(' | ');
    process.stderr.write(`Usage: npm run bench -- ${names} [--json]\n`);
    return 2;
  }
  const report = await bench(args.slice(1));
  process.stdout.write(
    args.includes('--json') ? `${JSON.stringify(report)}\n` : `${benchTable(report)}\n`,
  );
  return report.met ? 0 : 1;
}

main(process.argv.slice(2)).then(
  (status) => {
    process.exitCode = status;
  },
  (error: unknown) => {
    process.stderr.write(`${error instanceof Error ? error.message : String(error)}\n`);
    process.exitCode = 2;
  },
);
