import type { ReplyOf } from '@shared/contract/endpoint';
import { notFound } from '@shared/problem';
import { recurrenceWords } from '@shared/programmes/recurrence-words';
import type { RuleDefinition } from '@shared/programmes/rule-definition';
import type { explainTask as endpoint } from '@shared/tasks/tasks-contract';
import { whySentences } from '@shared/tasks/why-words';
import { Binds } from '@db/binds';
import type { Tenant } from '@db/tenant-transaction';
import type { Actor } from '../access/actor';
import { taskConditions } from './task-conditions';

interface Row {
  ruleId: string;
  ruleName: string;
  programmeId: string;
  programmeName: string;
  revision: number;
  currentRevision: number;
  recurrence: RuleDefinition['recurrence'];
  window: RuleDefinition['window'];
  madeAt: Date | null;
  madeBy: string | null;
  storeNumber: string;
  storeName: string;
  unitTag: string | null;
  occursLocal: string;
  timeZone: string;
  scheduleFrom: string;
  endedAt: Date | null;
  deferredFrom: string | null;
  dueOn: string;
  opensAt: Date;
  closesAt: Date;
  lapsesAt: Date;
}

const MOST_EVENTS = 50;

/** Why a task is there. @throws Problem 404 when it does not exist or lies out of sight */
export async function explainTask(
  tenant: Tenant,
  actor: Actor,
  id: string,
  now: Date,
): Promise<ReplyOf<typeof endpoint>> {
  const binds = new Binds();
  const row = await tenant.row<Row>(
    `SELECT r.id AS "ruleId", r.name AS "ruleName", p.id AS "programmeId", p.name AS "programmeName",
       t.rule_revision AS revision, r.revision AS "currentRevision",
       coalesce(v.definition -> 'recurrence', r.recurrence) AS recurrence,
       coalesce(v.definition -> 'window', r.time_window) AS "window", v.made_at AS "madeAt",
       by.name AS "madeBy", s.number AS "storeNumber", s.name AS "storeName", u.tag AS "unitTag",
       t.occurs_local AS "occursLocal", t.time_zone AS "timeZone", sc.from_on AS "scheduleFrom",
       sc.ended_at AS "endedAt", t.deferred_from AS "deferredFrom", t.due_on AS "dueOn",
       t.opens_at AS "opensAt", t.closes_at AS "closesAt", t.lapses_at AS "lapsesAt"
     FROM tasks t
     JOIN stores s ON s.id = t.store_id
     JOIN rules r ON r.id = t.rule_id
     JOIN programmes p ON p.id = r.programme_id
     JOIN schedules sc ON sc.id = t.schedule_id
     LEFT JOIN units u ON u.id = t.unit_id
     LEFT JOIN rule_revisions v ON v.rule_id = t.rule_id AND v.revision = t.rule_revision
     LEFT JOIN people by ON by.id = v.made_by
     WHERE t.id = ${binds.add(id)} AND ${taskConditions(actor, 'tasks.read', {}, now, binds)}`,
    binds.values,
  );
  if (!row) throw notFound('task');
  const words = recurrenceWords(row.recurrence);
  const inWords = (language: 'en' | 'es') =>
    whySentences(
      {
        ...row,
        recurrence: words[language],
        place: placeOf(row, language),
        opensAt: row.opensAt.getTime(),
        closesAt: row.closesAt.getTime(),
        lapsesAt: row.lapsesAt.getTime(),
        endedAt: row.endedAt?.getTime() ?? null,
      },
      language,
    );
  return {
    sentences: { en: inWords('en'), es: inWords('es') },
    rule: {
      id: row.ruleId,
      name: row.ruleName,
      programmeId: row.programmeId,
      programmeName: row.programmeName,
      revision: row.revision,
      currentRevision: row.currentRevision,
      words,
      madeAt: row.madeAt?.toISOString() ?? null,
      madeBy: row.madeBy,
    },
    occursLocal: row.occursLocal,
    timeZone: row.timeZone,
    window: row.window,
    scheduleFrom: row.scheduleFrom,
    scheduleEndedAt: row.endedAt?.toISOString() ?? null,
    deferredFrom: row.deferredFrom,
    events: await eventsOf(tenant, id),
  };
}

function placeOf({ unitTag, storeNumber, storeName }: Row, language: 'en' | 'es'): string {
  const store = `${storeNumber} ${storeName}`;
  return unitTag ? `${unitTag} ${language === 'es' ? 'en' : 'in'} ${store}` : store;
}

async function eventsOf(tenant: Tenant, id: string) {
  const rows = await tenant.rows<{ at: Date; by: string | null; action: string }>(
    `SELECT e.at, p.name AS by, e.action FROM audit_events e LEFT JOIN people p ON p.id = e.actor_id
     WHERE e.subject_kind = 'task' AND e.subject_id = $1 ORDER BY e.id DESC LIMIT ${MOST_EVENTS}`,
    [id],
  );
  return rows.map(({ at, ...event }) => ({ ...event, at: at.toISOString() }));
}
