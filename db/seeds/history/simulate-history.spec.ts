import { addDays, type CalendarDate } from '@shared/calendar/calendar-date';
import { monthlySealCheck } from '../procedures/monthly-seal-check';
import { shiftPaperCheck } from '../procedures/shift-paper-check';
import { namedId, seededRandom } from '../world/random';
import type { HistoryTask, HistoryWorld, StoreLife } from './history-world';
import { simulateHistory } from './simulate-history';
import { conditionAtStart } from './unit-condition';

const first = '2025-06-01' as CalendarDate;
const now = new Date('2026-11-30T12:00:00Z');
const HOUR = 3_600_000;

describe('the history of the demo world', () => {
  it('is the same for the same seed', () => {
    const [one, other] = [run(7), run(7)];
    expect(one.inspections).toEqual(other.inspections);
    expect([...one.findings.values()]).toEqual([...other.findings.values()]);
  });

  it('wears the seals of a store that skips its paper checks', () => {
    const rows = run(11);
    const seals = (store: string) =>
      [...rows.findings.values()].filter(
        (it) => it['store_id'] === store && it['cause'] === 'worn-seal',
      ).length;
    expect(seals('careless')).toBeGreaterThan(2 * seals('careful'));
  });

  it('does nothing after now and settles only what it found', () => {
    const rows = run(3);
    expect(rows.outcomes.every(({ at }) => at === null || at < now)).toBe(true);
    for (const finding of rows.findings.values()) {
      const settled = finding['settled_at'] as Date | null;
      if (!settled) continue;
      expect(settled > (finding['found_at'] as Date) && settled <= now).toBe(true);
    }
    const repaired = new Set(rows.repairs.map((repair) => repair['finding_id']));
    expect([...repaired].every((id) => rows.findings.has(id as string))).toBe(true);
  });
});

function run(seed: number) {
  const random = seededRandom(seed);
  const stores = new Map(
    [store('careful', 0.97, random), store('careless', 0.55, random)].map((it) => [it.id, it]),
  );
  const world: HistoryWorld = {
    stores,
    procedures: new Map([
      ['shift-paper', { versionId: 'v1', content: shiftPaperCheck }],
      ['monthly-seal', { versionId: 'v2', content: monthlySealCheck }],
    ]),
    newId: () => namedId(random),
  };
  return simulateHistory(world, tasks([...stores.values()]), random, now);
}

function store(id: string, discipline: number, random: () => number): StoreLife {
  return {
    id,
    units: Array.from({ length: 12 }, (_, nth) => ({
      id: `${id}-${nth}`,
      condition: conditionAtStart(random),
      nameplate: { volts: 115, amps: 9.2 },
      fitted: new Map(),
      open: [],
    })),
    discipline,
    technicianReliability: 0.95,
    plannedAhead: 0.5,
    technicianId: 'technician',
    managerId: `${id}-manager`,
    plannerId: 'planner',
    waterDay: null,
    day: first,
    missedChecks: 0,
    waterGotIn: false,
    open: [],
  };
}

/** Two paper checks a day, and a seal check of each unit every thirtieth day. */
function tasks(stores: readonly StoreLife[]): HistoryTask[] {
  return Array.from({ length: 560 }, (_, nth) => addDays(first, nth)).flatMap((day, nth) =>
    stores.flatMap(({ id, units }) => [
      task(id, null, 'shift-paper', day, 15),
      task(id, null, 'shift-paper', day, 22),
      ...(nth % 30 === 0 ? units.map((unit) => task(id, unit.id, 'monthly-seal', day, 14)) : []),
    ]),
  );
}

function task(
  storeId: string,
  unitId: string | null,
  code: string,
  dueOn: CalendarDate,
  hour: number,
): HistoryTask {
  const dueAt = new Date(Date.parse(`${dueOn}T00:00:00Z`) + hour * HOUR);
  const after = (hours: number) => new Date(dueAt.getTime() + hours * HOUR);
  return {
    id: `${storeId} ${unitId ?? ''} ${code} ${dueOn} ${hour}`,
    code,
    audience: unitId ? 'technician' : 'store',
    storeId,
    unitId,
    occursLocal: dueOn,
    dueOn,
    opensAt: after(-2),
    dueAt,
    closesAt: after(2),
    lapsesAt: after(5),
  };
}
