/**
 * The days on which each live store and unit stands under each programme, as the CTEs `store_days`
 * and `unit_days` with `live_stores` and `live_units` before them.
 *
 * A narrower enrolment outranks a wider one: what chains and regions put in, exceptions at chains and
 * regions take out; then stores put in and take out; then units. Set arithmetic on date multiranges
 * does it for all places at once, whatever their dates.
 *
 * @param of SQL true for the programmes (`p`) in question
 */
export function enrolledPlacesSql(of: string): string {
  const days = (when: string) =>
    `coalesce(range_agg(days) FILTER (WHERE ${when}), '{}'::datemultirange)`;
  return `
    put AS (
      SELECT e.programme_id, e.scope_kind, e.scope_id, e.exception,
        daterange(e.from_on, e.until_on, '[]') AS days
      FROM enrolments e JOIN programmes p ON p.id = e.programme_id
      WHERE p.retired_at IS NULL AND ${of}
    ),
    live_stores AS (SELECT * FROM stores WHERE retired_at IS NULL),
    live_units AS (
      SELECT u.id, u.store_id, u.kind, c.pump_face
      FROM units u JOIN live_stores s ON s.id = u.store_id
      LEFT JOIN LATERAL (
        SELECT pump_face FROM components c
        WHERE c.unit_id = u.id AND c.kind = 'pump' AND c.removed_on IS NULL
        ORDER BY c.installed_on DESC LIMIT 1
      ) c ON true
      WHERE u.retired_at IS NULL AND u.out_of_service_since IS NULL
    ),
    at_store AS (
      SELECT put.programme_id, s.id AS store_id, 'wide' AS level, put.exception, put.days
      FROM put JOIN live_stores s ON put.scope_kind = 'chain' AND s.chain_id = put.scope_id
      UNION ALL
      SELECT put.programme_id, s.id, 'wide', put.exception, put.days
      FROM put JOIN live_stores s ON put.scope_kind = 'region' AND s.region_id = put.scope_id
      UNION ALL
      SELECT put.programme_id, s.id, 'store', put.exception, put.days
      FROM put JOIN live_stores s ON put.scope_kind = 'store' AND s.id = put.scope_id
    ),
    store_days AS (
      SELECT programme_id, store_id,
        (${days(`level = 'wide' AND NOT exception`)} - ${days(`level = 'wide' AND exception`)}
          + ${days(`level = 'store' AND NOT exception`)}) - ${days(`level = 'store' AND exception`)}
          AS days
      FROM at_store GROUP BY programme_id, store_id
    ),
    at_unit AS (
      SELECT put.programme_id, u.id AS unit_id, ${days('NOT exception')} AS put_in,
        ${days('exception')} AS taken_out
      FROM put JOIN live_units u ON put.scope_kind = 'unit' AND u.id = put.scope_id
      GROUP BY put.programme_id, u.id
    ),
    unit_days AS (
      SELECT programme_id, unit_id,
        (coalesce(wider.days, '{}') + coalesce(own.put_in, '{}')) - coalesce(own.taken_out, '{}')
          AS days
      FROM (
        SELECT d.programme_id, u.id AS unit_id, d.days
        FROM store_days d JOIN live_units u ON u.store_id = d.store_id
      ) wider
      FULL JOIN at_unit own USING (programme_id, unit_id)
    )`;
}
