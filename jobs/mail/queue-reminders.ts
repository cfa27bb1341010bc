import { QueryTypes, type Sequelize } from 'sequelize';
import type { Logger } from 'pino';
import type { Config } from '@server/config';
import { queueLetter } from '@server/mail/queue-letter';
import { type RemindedTask, remindersMessage } from '@server/mail/messages/reminders-message';
import type { Locale } from '@shared/mail/locale';
import { inTenant, type Tenant } from '@db/tenant-transaction';
import { untoldTasksSql } from './untold-tasks-sql';

export interface ReminderServices {
  readonly sequelize: Sequelize;
  readonly config: Pick<Config, 'BASE_URL'>;
  readonly log: Pick<Logger, 'info' | 'error'>;
}

interface Reader {
  readonly id: string;
  readonly name: string;
  readonly email: string;
  readonly locale: Locale;
  readonly timeZone: string;
  readonly localDay: string;
}

interface UntoldTask extends Omit<RemindedTask, 'closesAt'> {
  readonly closesAt: Date;
}

/**
 * Queues the day's letter of everybody whose own clock shows 06:30 or later at `slot` and whom some
 * task concerns that they have not been told of: one letter per person and local day, with a notice
 * for each task in it. What is told is decided by the notices, not by the age of a task, so a day (or
 * a week) without a worker makes the next letter longer and skips nobody.
 *
 * Safe to run again and by several workers at once: the letter's key holds the local day, and letter
 * and notices are one transaction under a lock on the person.
 *
 * @returns how many letters were queued
 */
export async function queueReminders(services: ReminderServices, slot: Date): Promise<number> {
  const { sequelize, log } = services;
  const organisations = await sequelize.query<{ id: string }>(
    'SELECT id FROM all_organisations()',
    {
      type: QueryTypes.SELECT,
    },
  );
  let queued = 0;
  for (const { id: organisationId } of organisations) {
    const people = await inTenant(sequelize, organisationId, (tenant) => readersIn(tenant, slot));
    for (const personId of people) {
      try {
        queued += await inTenant(sequelize, organisationId, (tenant) =>
          remind(services, tenant, personId, slot),
        );
      } catch (error) {
        // One person's trouble must not keep the others waiting; the next slot tries again.
        log.error({ err: error, person: personId }, 'reminder not queued');
      }
    }
  }
  if (queued > 0) log.info({ queued }, 'reminders queued');
  return queued;
}

async function readersIn(tenant: Tenant, slot: Date): Promise<string[]> {
  const rows = await tenant.rows<{ personId: string }>(
    `SELECT DISTINCT u."personId" FROM (${untoldTasksSql('true')}) u
     JOIN people p ON p.id = u."personId"
     WHERE NOT EXISTS (SELECT FROM letters l WHERE l.dedupe_key =
       'reminders:' || p.id || ':' || ($1::timestamptz AT TIME ZONE p.time_zone)::date)`,
    [slot],
  );
  return rows.map(({ personId }) => personId);
}

async function remind(
  { config }: ReminderServices,
  tenant: Tenant,
  personId: string,
  slot: Date,
): Promise<0 | 1> {
  await tenant.rows(`SELECT pg_advisory_xact_lock(hashtextextended('reminders ' || $1, 0))`, [
    personId,
  ]);
  const reader = await tenant.row<Reader>(
    `SELECT id, name, email, locale, time_zone AS "timeZone",
       ($2::timestamptz AT TIME ZONE time_zone)::date::text AS "localDay"
     FROM people WHERE id = $1 AND disabled_at IS NULL AND email IS NOT NULL`,
    [personId, slot],
  );
  if (!reader) return 0;
  const tasks = await tenant.rows<UntoldTask>(
    `SELECT u."taskId", u.kind, u."closesAt", coalesce(v.content -> 'title' ->> $3, r.name) AS title,
       s.number || ' ' || s.name AS store, n.tag AS "unitTag"
     FROM (${untoldTasksSql('p.id = $2')}) u
     JOIN stores s ON s.id = u.store_id
     JOIN rules r ON r.id = u.rule_id
     LEFT JOIN units n ON n.id = u.unit_id
     LEFT JOIN LATERAL (SELECT content FROM procedure_versions
       WHERE procedure_id = u.procedure_id AND published_at IS NOT NULL
       ORDER BY number DESC LIMIT 1) v ON true
     ORDER BY u."closesAt", s.number, u."taskId"`,
    [slot, personId, reader.locale],
  );
  if (tasks.length === 0) return 0;
  const letterId = await queueLetter(tenant, {
    message: remindersMessage,
    content: {
      name: reader.name,
      timeZone: reader.timeZone,
      baseUrl: config.BASE_URL,
      tasks: tasks.map((task) => ({ ...task, closesAt: task.closesAt.getTime() })),
    },
    to: { personId, address: reader.email, locale: reader.locale },
    dedupeKey: `reminders:${personId}:${reader.localDay}`,
    at: slot,
  });
  if (letterId === null) return 0;
  await tenant.rows(
    `INSERT INTO task_notices (organisation_id, person_id, task_id, kind, letter_id)
     SELECT $1, $2, task_id, kind, $3 FROM unnest($4::uuid[], $5::text[]) AS told (task_id, kind)`,
    [
      tenant.organisationId,
      personId,
      letterId,
      tasks.map(({ taskId }) => taskId),
      tasks.map(({ kind }) => (kind === 'missed' ? 'overdue' : kind)),
    ],
  );
  return 1;
}
