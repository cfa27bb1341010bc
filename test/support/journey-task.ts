import { randomUUID } from 'node:crypto';
import { Client } from 'pg';

/**
 * Writes a task that is due now, whatever the hour of the run: another occurrence of a rule of the
 * demo world in its store 0101. With a technician's e-mail it stands on a visit of their day.
 */
export async function taskDueNow(ruleName: string, technician?: string): Promise<string> {
  const client = new Client({ connectionString: process.env['JOURNEY_DATABASE'] });
  await client.connect();
  try {
    const id = randomUUID();
    const { rowCount } = await client.query(
      `INSERT INTO tasks (id, organisation_id, schedule_id, rule_id, rule_revision, procedure_id,
         store_id, unit_id, audience, occurs_local, time_zone, due_on, opens_at, due_soon_at, due_at,
         closes_at, lapses_at, closes_on)
       SELECT $1, t.organisation_id, t.schedule_id, t.rule_id, t.rule_revision, t.procedure_id,
         t.store_id, t.unit_id, t.audience, clock_timestamp() AT TIME ZONE t.time_zone, t.time_zone,
         (now() AT TIME ZONE t.time_zone)::date, now() - interval '2 hours',
         now() - interval '1 hour', now(), now() + interval '30 minutes', now() + interval '1 day',
         (now() AT TIME ZONE t.time_zone)::date
       FROM tasks t JOIN stores s ON s.id = t.store_id JOIN rules r ON r.id = t.rule_id
       WHERE s.number = '0101' AND r.name = $2 ORDER BY t.id LIMIT 1`,
      [id, ruleName],
    );
    if (rowCount !== 1) throw new Error(`No task of "${ruleName}" to go by.`);
    if (technician) await putOnRoute(client, id, technician);
    return id;
  } finally {
    await client.end();
  }
}

async function putOnRoute(client: Client, taskId: string, technician: string): Promise<void> {
  const route = await client.query<{ id: string }>(
    `INSERT INTO routes (id, organisation_id, technician_id, on_date, published_at)
     SELECT gen_random_uuid(), organisation_id, id, (now() AT TIME ZONE time_zone)::date, now()
     FROM people WHERE email = $1
     ON CONFLICT (technician_id, on_date) DO UPDATE SET published_at = now() RETURNING id`,
    [technician],
  );
  const visit = await client.query<{ id: string }>(
    `INSERT INTO visits (id, organisation_id, route_id, store_id, position)
     SELECT gen_random_uuid(), t.organisation_id, $2, t.store_id,
       (SELECT count(*) FROM visits WHERE route_id = $2)
     FROM tasks t WHERE t.id = $1
     ON CONFLICT (route_id, store_id) DO UPDATE SET note = visits.note RETURNING id`,
    [taskId, route.rows[0]?.id],
  );
  await client.query('UPDATE tasks SET visit_id = $2 WHERE id = $1', [taskId, visit.rows[0]?.id]);
}
