import { type GenerationOptions, generateTasks } from '@server/tasks/generate-tasks';
import { type TestDatabase } from '@test/support/test-database';
import { type Fleet, insert, makeFleet } from './organisation-factory';
import { makeProcedure } from './programme-factory';

/** Monday 10:00 in Chicago, where the factories' stores are. */
export const generationDay = new Date('2026-06-01T15:00:00Z');

export interface WrittenTask {
  id: string;
  scheduleId: string;
  occursLocal: string;
  revision: number;
  outcome: string;
  opensAt: Date;
  closesAt: Date;
  lapsesAt: Date;
}

/** An organisation with a unit and a programme, and hands to make rules and schedules for it. */
export class GenerationBench {
  private constructor(
    private readonly db: TestDatabase,
    readonly fleet: Fleet,
    private readonly procedureId: string,
    readonly programmeId: string,
  ) {}

  static async make(db: TestDatabase): Promise<GenerationBench> {
    const fleet = await makeFleet(db);
    const { organisationId } = fleet;
    const programmeId = await insert(db, 'programmes', {
      organisation_id: organisationId,
      name: 'Programme',
    });
    return new GenerationBench(db, fleet, await makeProcedure(db, organisationId), programmeId);
  }

  generate = (now = generationDay, options: GenerationOptions = {}) =>
    generateTasks(this.db.app, this.fleet.organisationId, now, options);

  /** A rule at 09:00 for units, two days either side, thirty days ahead. */
  makeRule(rrule: string, row: object = {}): Promise<string> {
    return insert(this.db, 'rules', {
      organisation_id: this.fleet.organisationId,
      programme_id: this.programmeId,
      procedure_id: this.procedureId,
      name: `Rule ${rrule} ${JSON.stringify(row)} ${Math.random()}`,
      audience: 'technician',
      applies_to: 'unit',
      recurrence: { startsLocal: '2026-01-05T09:00:00', rrules: [rrule], rdates: [], exdates: [] },
      time_window: { kind: 'days', before: 2, after: 2, late: null, dueSoon: 1 },
      horizon_days: 30,
      ...row,
    });
  }

  makeSchedule(ruleId: string, row: object = {}): Promise<string> {
    return insert(this.db, 'schedules', {
      organisation_id: this.fleet.organisationId,
      rule_id: ruleId,
      store_id: this.fleet.storeId,
      unit_id: this.fleet.unitId,
      from_on: '2026-06-01',
      ...row,
    });
  }

  /** Gives a rule its next revision, as an edit at that instant does. */
  async revise(ruleId: string, at: Date, set: string): Promise<void> {
    await this.db.owner.query(`UPDATE rules SET revision = revision + 1, ${set} WHERE id = $1`, {
      bind: [ruleId],
    });
    await this.db.owner.query(
      `INSERT INTO rule_revisions (organisation_id, rule_id, revision, definition, made_at)
       SELECT organisation_id, id, revision, '{}', $2 FROM rules WHERE id = $1`,
      { bind: [ruleId, at] },
    );
  }

  async tasks(ruleId: string): Promise<WrittenTask[]> {
    const [rows] = await this.db.owner.query(
      `SELECT id, schedule_id AS "scheduleId", occurs_local AS "occursLocal",
         rule_revision AS revision, outcome, opens_at AS "opensAt", closes_at AS "closesAt",
         lapses_at AS "lapsesAt"
       FROM tasks WHERE rule_id = $1 ORDER BY occurs_local, schedule_id`,
      { bind: [ruleId] },
    );
    return rows as WrittenTask[];
  }

  /** Dates on which the tasks of a rule occur. */
  async days(ruleId: string): Promise<string[]> {
    return (await this.tasks(ruleId)).map(({ occursLocal }) => occursLocal.slice(0, 10));
  }
}
