import { addDays, type CalendarDate } from '@shared/calendar/calendar-date';
import type { Staff } from '../demo/seed-people';
import type { World, WorldStore } from '../world/fleet';
import { regions } from '../world/places';
import type { FittedPart, HistoryUnit, StoreLife } from './history-world';
import { conditionAtStart } from './unit-condition';

/** How the regions' technicians keep their windows, and how far their planner is ahead. */
const regionHabits = [
  { technicianReliability: 0.93, plannedAhead: 0.7 },
  { technicianReliability: 0.84, plannedAhead: 0.45 },
  { technicianReliability: 0.95, plannedAhead: 0.85 },
];

/** Days before today on which water went through the one store's filter. */
const WATER_DAYS_AGO = 205;

/** The stores of the world at the beginning of their history, with their people. */
export function makeLives(
  world: World,
  staff: readonly Staff[],
  first: CalendarDate,
  random: () => number,
  now: Date,
): ReadonlyMap<string, StoreLife> {
  const today = now.toISOString().slice(0, 10) as CalendarDate;
  const turns = regions.map(() => 0);
  return new Map(
    world.stores.map((store) => {
      const technicians = inRegion(staff, 'technician', store);
      const turn = turns[store.region] ?? 0;
      turns[store.region] = turn + 1;
      const life: StoreLife = {
        id: store.id,
        units: unitsOf(world, store, random),
        discipline: store.discipline,
        ...(regionHabits[store.region] ?? { technicianReliability: 0.9, plannedAhead: 0.6 }),
        technicianId: pick(technicians, turn).id,
        managerId: pick(
          staff.filter(({ storeId }) => storeId === store.id),
          0,
        ).id,
        plannerId: pick(inRegion(staff, 'regional-facility-manager', store), 0).id,
        waterDay: store.letWaterIn ? addDays(today, -WATER_DAYS_AGO) : null,
        day: first,
        missedChecks: 0,
        waterGotIn: false,
        open: [],
      };
      return [store.id, life];
    }),
  );
}

function unitsOf(world: World, store: WorldStore, random: () => number): HistoryUnit[] {
  return world.units
    .filter((unit) => unit.store === store)
    .map((unit) => {
      const fitted = new Map<string, FittedPart>();
      for (const part of world.parts.filter((it) => it.unit === unit)) {
        const row = world.rows.components.find((it) => it['id'] === part.id);
        fitted.set(part.kind, {
          id: part.id,
          model: String(row?.['model'] ?? ''),
          nameplate: (row?.['nameplate'] ?? {}) as object,
          pumpFace: (row?.['pump_face'] ?? null) as string | null,
        });
      }
      const plate = (fitted.get('motor')?.nameplate ?? {}) as { volts?: number; amps?: number };
      return {
        id: unit.id,
        condition: conditionAtStart(random),
        nameplate: { volts: plate.volts ?? null, amps: plate.amps ?? null },
        fitted,
        open: [],
      };
    });
}

function inRegion(staff: readonly Staff[], role: string, store: WorldStore): Staff[] {
  return staff.filter(
    ({ person }) => person.role === role && person.over === regions[store.region],
  );
}

function pick(staff: readonly Staff[], turn: number): Staff {
  const person = staff[turn % staff.length];
  if (!person) throw new Error('The demo world has a store without its people.');
  return person;
}
