import type { RuleDefinition } from '@shared/programmes/rule-definition';
import type { CalendarDate } from '@shared/calendar/calendar-date';
import type { Tenant } from '@db/tenant-transaction';
import type { Actor } from '@server/access/actor';
import { addStarterProcedures } from '@server/procedures/add-starter-procedures';
import { addRule } from '@server/programmes/add-rule';
import { createProgramme } from '@server/programmes/create-programme';
import { enrol } from '@server/programmes/enrol';
import { namedId } from '../world/random';

type Draft = Pick<RuleDefinition, 'name' | 'audience' | 'appliesTo' | 'window' | 'rank'> & {
  readonly code: string;
  readonly rrule: string;
  readonly time: string;
  readonly horizonDays?: number;
  readonly pumpFace?: RuleDefinition['pumpFace'];
};

const days = (before: number, after: number, late: number | null, dueSoon: number) =>
  ({ kind: 'days', before, after, late, dueSoon }) as const;

/** Intervals are common practice; see the procedures' own notes. */
const drafts: readonly Draft[] = [
  {
    code: 'shift-paper',
    name: 'Filter paper, each shift',
    audience: 'store',
    appliesTo: 'store',
    rrule: 'FREQ=DAILY;BYHOUR=10,22;BYMINUTE=0;BYSECOND=0',
    time: '10:00:00',
    window: { kind: 'hours', before: 3, after: 2, late: 3, dueSoon: 1 },
    rank: 0,
    horizonDays: 14,
  },
  {
    code: 'no-water',
    name: 'No water in the filter',
    audience: 'store',
    appliesTo: 'store',
    rrule: 'FREQ=WEEKLY;BYDAY=MO',
    time: '14:00:00',
    window: days(0, 1, 2, 0),
    rank: 0,
    horizonDays: 30,
  },
  {
    code: 'weekly-pan',
    name: 'Pan and O-rings, weekly',
    audience: 'store',
    appliesTo: 'store',
    rrule: 'FREQ=WEEKLY;BYDAY=TH',
    time: '15:00:00',
    window: days(1, 1, 3, 1),
    rank: 0,
    horizonDays: 30,
  },
  {
    code: 'monthly-seal',
    name: 'Pump seal at the drain slot',
    audience: 'technician',
    appliesTo: 'unit',
    pumpFace: 'drain-slot',
    rrule: 'FREQ=MONTHLY;BYDAY=2WE',
    time: '09:00:00',
    window: days(3, 3, 18, 3),
    rank: 1,
  },
  {
    code: 'monthly-current',
    name: 'Motor current and overload',
    audience: 'technician',
    appliesTo: 'unit',
    rrule: 'FREQ=MONTHLY;BYDAY=3TU',
    time: '09:00:00',
    window: days(3, 3, 20, 3),
    rank: 1,
  },
  {
    code: 'quarterly-pump',
    name: 'Pump cover off, quarterly',
    audience: 'technician',
    appliesTo: 'unit',
    rrule: 'FREQ=MONTHLY;INTERVAL=3;BYDAY=1MO',
    time: '08:00:00',
    window: days(7, 7, 21, 7),
    rank: 2,
    horizonDays: 120,
  },
  {
    code: 'boil-out',
    name: 'Boil-out with the filter isolated',
    audience: 'store',
    appliesTo: 'store',
    rrule: 'FREQ=MONTHLY;BYDAY=-1TU',
    time: '21:00:00',
    window: days(2, 2, 5, 2),
    rank: 0,
  },
  {
    code: 'annual-electrical',
    name: 'Electrical and hose, yearly',
    audience: 'technician',
    appliesTo: 'unit',
    rrule: 'FREQ=YEARLY;BYMONTH=3;BYDAY=1TU',
    time: '08:00:00',
    window: days(14, 14, 30, 14),
    rank: 3,
    horizonDays: 200,
  },
];

/** Starter procedures, one programme with its rules, every chain enrolled from the first day on. */
export async function seedProgrammes(
  tenant: Tenant,
  actor: Actor,
  chainIds: readonly string[],
  from: CalendarDate,
  random: () => number,
): Promise<void> {
  const now = new Date(`${from}T06:00:00Z`);
  await addStarterProcedures(tenant, actor, now);
  const procedures = await tenant.rows<{ id: string; code: string }>(
    'SELECT id, code FROM procedures',
  );
  const programmeId = namedId(random);
  await createProgramme(tenant, actor, {
    id: programmeId,
    name: 'Filter care',
    description: 'Paper, water, seal and motor: what keeps the filtration of a fryer alive.',
  });
  for (const chainId of chainIds) {
    await enrol(tenant, actor, {
      id: namedId(random),
      programmeId,
      scopeKind: 'chain',
      scopeId: chainId,
      exception: false,
      fromOn: from,
      untilOn: null,
      now,
    });
  }
  for (const { code, rrule, time, horizonDays, pumpFace, ...draft } of drafts) {
    await addRule(tenant, actor, {
      ...draft,
      id: namedId(random),
      programmeId,
      procedureId: procedures.find((it) => it.code === code)?.id ?? '',
      unitKind: null,
      pumpFace: pumpFace ?? null,
      recurrence: { startsLocal: `${from}T${time}`, rrules: [rrule], rdates: [], exdates: [] },
      horizonDays: horizonDays ?? 60,
      now,
    });
  }
}
