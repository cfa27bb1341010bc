import type { LongJobRun, LongJobServices } from '../long-jobs/long-job';
import { beginWork } from './begin-work';
import { ImportPass } from './import-pass';
import { forgetProblems, keepProblems } from './keep-problems';

/**
 * Looks at every row of a file and writes down what is wrong, and what an import would do. Changes
 * nothing of the fleet. A lost worker's successor begins anew.
 */
export async function runCheck(services: LongJobServices, run: LongJobRun): Promise<void> {
  const { record, actor, stretches } = await beginWork(services, run);
  let total = 0;
  for await (const rows of stretches()) total += rows.length;
  let done = 0;
  await run.show({ done, total });
  const pass = await run.inTenant(async (tenant) => {
    await forgetProblems(tenant, record.id);
    return ImportPass.begin(tenant, record.kind, actor, services.now());
  });
  for await (const rows of stretches()) {
    await run.inTenant(async (tenant) => {
      const { problems } = await pass.take(tenant, rows, false);
      await keepProblems(tenant, record.id, pass, problems);
      done += rows.length;
      await run.keep(tenant, { done, total }, {});
    });
  }
  await run.inTenant(async (tenant) => {
    await tenant.rows('UPDATE imports SET checked = $2, version = version + 1 WHERE id = $1', [
      record.id,
      JSON.stringify(pass.outcome),
    ]);
    await run.finish(tenant, { done, total }, pass.outcome);
  });
}
