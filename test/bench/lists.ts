import { connect } from '@db/connect';
import { inTenant } from '@db/tenant-transaction';
import { fleetPassword } from '@db/seeds/fleet/fleet-people';
import { makeFleet } from '@db/seeds/fleet/make-fleet';
import type { BenchFigure, BenchReport } from './bench-report';
import { type BenchDatabase, benchDatabase } from './bench-database';
import { wholeNumber } from './bench-options';
import { benchServer } from './bench-server';
import { type FleetFacts, listPages } from './list-pages';
import { percentile, steadyLoad } from './steady-load';

const BAR = 100;
const PER_SECOND = 50;

/**
 * Every list page at 50 requests a second, one page after the other, against the real server on a
 * fleet with a year behind it.
 *
 * `--stores N` (600), `--seconds S` of each page (6), `--only TEXT` in the page's name, `--fresh` to
 * make the fleet anew where one stands.
 */
export async function benchLists(args: readonly string[]): Promise<BenchReport> {
  const stores = wholeNumber(args, 'stores', 600);
  const seconds = wholeNumber(args, 'seconds', 6);
  const only = args.includes('--only') ? (args[args.indexOf('--only') + 1] ?? '') : '';
  const database = await benchDatabase(`bench_lists_${stores}`, args.includes('--fresh'));
  try {
    const facts = await fleetOf(database, stores);
    const server = await benchServer(database.appUrl);
    const figures: BenchFigure[] = [{ name: 'stores', value: stores }];
    let met = true;
    try {
      const cookies = new Map<string, string>();
      for (const { name, as, path } of listPages(facts).filter((it) => it.name.includes(only))) {
        const email = `${as}.1@fleet${stores}.example`;
        const cookie = cookies.get(as) ?? (await server.signIn(email, fleetPassword));
        cookies.set(as, cookie);
        const url = `${server.url}${path}`;
        await steadyLoad(url, { cookie, perSecond: 10, seconds: 1 });
        const load = await steadyLoad(url, { cookie, perSecond: PER_SECOND, seconds });
        const p95 = percentile(load.times, 0.95);
        met &&= p95 <= BAR && load.failures === 0;
        figures.push(
          { name: `${name}: p95`, value: Math.round(p95), unit: verdict(p95, load.failures) },
          { name: `${name}: median`, value: Math.round(percentile(load.times, 0.5)), unit: 'ms' },
        );
      }
    } finally {
      await server.close();
    }
    const bar = `p95 of every list at most ${BAR} ms at ${PER_SECOND} requests a second`;
    return { bench: 'lists', bar, met, figures };
  } finally {
    await database.close();
  }
}

function verdict(p95: number, failures: number): string {
  if (failures > 0) return `ms, ${failures} FAILED`;
  return p95 <= BAR ? 'ms' : 'ms, TOO SLOW';
}

async function fleetOf(database: BenchDatabase, stores: number): Promise<FleetFacts> {
  const long = { poolSize: 2, statementTimeout: 1_800_000 };
  const owner = connect(database.ownerUrl, long);
  const app = connect(database.appUrl, long);
  try {
    const now = new Date();
    const [found] = await owner.query('SELECT id FROM organisations');
    const [organisation] = found as { id: string }[];
    const organisationId =
      organisation?.id ??
      (await makeFleet(owner, app, stores, now, (step) => process.stderr.write(`${step}\n`)))
        .organisationId;
    const facts = await inTenant(app, organisationId, (tenant) =>
      tenant.row<Omit<FleetFacts, 'today'>>(
        `SELECT (SELECT id FROM stores ORDER BY number LIMIT 1) AS "storeId",
           (SELECT id FROM people WHERE email LIKE 'technician.1@%') AS "technicianId",
           (SELECT id FROM rules WHERE audience = 'technician' ORDER BY name LIMIT 1) AS "ruleId"`,
      ),
    );
    if (!facts) throw new Error('The fleet is empty.');
    return { ...facts, today: now.toISOString().slice(0, 10) };
  } finally {
    await Promise.all([owner.close(), app.close()]);
  }
}
