import type { ProcedureContent } from '@shared/procedures/procedure-content';
import type { TestDatabase } from '@test/support/test-database';
import { type Fleet, insert } from './organisation-factory';

const both = (en: string) => ({ en, es: `${en} (es)` });

/** A procedure with one step of each judging kind: a tick, a number against the nameplate, a choice. */
export const procedureContent: ProcedureContent = {
  title: both('Motor current'),
  purpose: both('Find a motor that works too hard.'),
  minutes: 10,
  tools: [both('Clamp meter')],
  parts: [],
  cautions: [both('Lock out before opening the terminal box.')],
  steps: [
    { key: 'vents', kind: 'check', text: both('Vents are clear'), required: true },
    {
      key: 'amps',
      kind: 'number',
      text: both('Running current'),
      required: true,
      component: 'motor',
      cause: 'bearing',
      severity: 'plan',
      number: { unit: 'A', limitFrom: 'nameplate-amps' },
    },
    {
      key: 'seal',
      kind: 'choice',
      text: both('Drain slot'),
      required: false,
      component: 'pump',
      choices: [
        { key: 'dry', text: both('Dry') },
        {
          key: 'drips',
          text: both('Drips'),
          outOfLimit: true,
          cause: 'worn-seal',
          severity: 'stop',
        },
      ],
    },
  ],
};

export interface Work {
  readonly procedureVersionId: string;
  readonly ruleId: string;
  readonly scheduleId: string;
}

let rules = 0;

/** A published procedure, a rule for it and a schedule on the fleet's unit (or store). */
export async function makeWork(
  db: TestDatabase,
  fleet: Fleet,
  audience: 'technician' | 'store' = 'technician',
): Promise<Work & { makeTask: (row?: object) => Promise<string> }> {
  rules += 1;
  const own = { organisation_id: fleet.organisationId };
  const procedureId = await insert(db, 'procedures', { ...own, code: `procedure-${rules}` });
  const procedureVersionId = await insert(db, 'procedure_versions', {
    ...own,
    procedure_id: procedureId,
    number: 1,
    content: procedureContent,
    published_at: '2026-01-01T00:00:00Z',
  });
  const programmeId = await insert(db, 'programmes', { ...own, name: `Programme ${rules}` });
  const unitId = audience === 'technician' ? fleet.unitId : null;
  const ruleId = await insert(db, 'rules', {
    ...own,
    programme_id: programmeId,
    procedure_id: procedureId,
    name: `Rule ${rules}`,
    audience,
    applies_to: unitId ? 'unit' : 'store',
    recurrence: {
      startsLocal: '2026-01-05T09:00:00',
      rrules: ['FREQ=WEEKLY'],
      rdates: [],
      exdates: [],
    },
    time_window: { kind: 'days', before: 2, after: 2, late: 3, dueSoon: 1 },
  });
  const scheduleId = await insert(db, 'schedules', {
    ...own,
    rule_id: ruleId,
    store_id: fleet.storeId,
    unit_id: unitId,
    from_on: '2026-01-05',
  });
  /** A task due on Wednesday 2026-06-10 at 09:00 in Chicago, open two days either side. */
  const makeTask = (row: object = {}) =>
    insert(db, 'tasks', {
      ...own,
      schedule_id: scheduleId,
      rule_id: ruleId,
      rule_revision: 1,
      procedure_id: procedureId,
      store_id: fleet.storeId,
      unit_id: unitId,
      audience,
      occurs_local: '2026-06-10T09:00:00',
      time_zone: 'America/Chicago',
      due_on: '2026-06-10',
      opens_at: '2026-06-08T05:00:00Z',
      due_soon_at: '2026-06-09T05:00:00Z',
      due_at: '2026-06-10T14:00:00Z',
      closes_at: '2026-06-13T05:00:00Z',
      lapses_at: '2026-06-16T05:00:00Z',
      closes_on: '2026-06-12',
      ...row,
    });
  return { procedureVersionId, ruleId, scheduleId, makeTask };
}
