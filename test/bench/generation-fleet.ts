import type { Sequelize } from 'sequelize';

/** What a unit is under: eight rules, from a weekly look to a yearly one. */
const rules = [
  ['weekly-look', 'FREQ=WEEKLY;BYDAY=TH', '15:00:00', 'store'],
  ['fortnight-clean', 'FREQ=WEEKLY;INTERVAL=2;BYDAY=MO', '14:00:00', 'store'],
  ['monthly-seal', 'FREQ=MONTHLY;BYDAY=2WE', '09:00:00', 'technician'],
  ['monthly-current', 'FREQ=MONTHLY;BYDAY=3TU', '09:00:00', 'technician'],
  ['monthly-boil-out', 'FREQ=MONTHLY;BYDAY=-1TU', '21:00:00', 'store'],
  ['quarterly-pump', 'FREQ=MONTHLY;INTERVAL=3;BYDAY=1MO', '08:00:00', 'technician'],
  ['half-yearly-hose', 'FREQ=MONTHLY;INTERVAL=6;BYMONTHDAY=10', '08:00:00', 'technician'],
  ['yearly-electrical', 'FREQ=YEARLY;BYMONTH=3;BYDAY=1TU', '08:00:00', 'technician'],
] as const;

const zones = [
  'America/New_York',
  'America/Chicago',
  'America/Denver',
  'America/Phoenix',
  'America/Los_Angeles',
];

export const HORIZON_DAYS = 120;

/**
 * An organisation of so many stores with six units each and a schedule for every unit and rule, with
 * nothing written yet. As the owner, set-based: only writing tasks is measured.
 */
export async function makeGenerationFleet(
  owner: Sequelize,
  stores: number,
  today: string,
): Promise<{ organisationId: string; schedules: number }> {
  const organisationId = '00000000-0000-4000-8000-000000000001';
  const run = (sql: string, bind: unknown[] = []) => owner.query(sql, { bind });
  const id = (kind: string, number: string) => `md5('${kind}' || ${number})::uuid`;
  const own = `'${organisationId}'::uuid`;
  await run(`INSERT INTO organisations (id, name, time_zone) VALUES (${own}, 'Bench', 'UTC')`);
  await run(
    `INSERT INTO chains (id, organisation_id, name) VALUES (${id('chain', `''`)}, ${own}, 'C')`,
  );
  await run(
    `INSERT INTO regions (id, organisation_id, name) VALUES (${id('region', `''`)}, ${own}, 'R')`,
  );
  await run(
    `INSERT INTO stores (id, organisation_id, chain_id, region_id, number, name, latitude, longitude,
       position_from, time_zone)
     SELECT ${id('store', 'n')}, ${own}, ${id('chain', `''`)}, ${id('region', `''`)}, n::text,
       'Store ' || n, 40, -90, 'coordinates', ($2::text[])[1 + n % cardinality($2::text[])]
     FROM generate_series(1, $1::int) n`,
    [stores, zones],
  );
  await run(
    `INSERT INTO units (id, organisation_id, store_id, tag, kind, vats)
     SELECT ${id('unit', `n || '-' || m`)}, ${own}, ${id('store', 'n')}, 'F-' || m, 'built-in', 3
     FROM generate_series(1, $1::int) n, generate_series(1, 6) m`,
    [stores],
  );
  await run(
    `INSERT INTO programmes (id, organisation_id, name) VALUES (${id('programme', `''`)}, ${own}, 'P')`,
  );
  for (const [code, rrule, time, audience] of rules) {
    await run(
      `INSERT INTO procedures (id, organisation_id, code) VALUES (${id('procedure', '$1::text')}, ${own}, $1)`,
      [code],
    );
    await run(
      `INSERT INTO rules (id, organisation_id, programme_id, procedure_id, name, audience, applies_to,
         recurrence, time_window, horizon_days)
       VALUES (${id('rule', '$1::text')}, ${own}, ${id('programme', `''`)}, ${id('procedure', '$1::text')},
         $1, $2, 'unit', $3, '{"kind":"days","before":3,"after":3,"late":10,"dueSoon":3}', $4)`,
      [
        code,
        audience,
        JSON.stringify({
          startsLocal: `2025-01-01T${time}`,
          rrules: [rrule],
          rdates: [],
          exdates: [],
        }),
        HORIZON_DAYS,
      ],
    );
  }
  await run(
    `INSERT INTO schedules (id, organisation_id, rule_id, store_id, unit_id, from_on)
     SELECT md5('schedule' || r.name || u.id)::uuid, ${own}, r.id, u.store_id, u.id, $1::date
     FROM rules r, units u`,
    [today],
  );
  await run('ANALYZE');
  return { organisationId, schedules: stores * 6 * rules.length };
}
