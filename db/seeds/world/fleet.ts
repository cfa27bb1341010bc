import { lookup } from 'zipcodes';
import tzLookup from '@photostructure/tz-lookup';
import { type CalendarDate, addDays } from '@shared/calendar/calendar-date';
import { chains, regions, stores } from './places';
import { namedId } from './random';

export interface WorldStore {
  readonly id: string;
  readonly number: string;
  readonly name: string;
  readonly chain: number;
  readonly region: number;
  readonly timeZone: string;
  /** How faithfully the crew keeps paper discipline, 0 to 1: what wears seals and jams rotors. */
  readonly discipline: number;
  /** The one store that pumped water through its filter. */
  readonly letWaterIn: boolean;
}

export interface WorldUnit {
  readonly id: string;
  readonly store: WorldStore;
  readonly tag: string;
  readonly face: 'drain-slot' | 'gasket';
}

export interface WorldPart {
  readonly id: string;
  readonly unit: WorldUnit;
  readonly kind: 'pump' | 'motor' | 'pan' | 'hose';
}

type Row = Record<string, unknown>;

export interface World {
  readonly chainIds: readonly string[];
  readonly regionIds: readonly string[];
  readonly stores: readonly WorldStore[];
  readonly units: readonly WorldUnit[];
  readonly parts: readonly WorldPart[];
  readonly rows: Readonly<Record<'chains' | 'regions' | 'stores' | 'units' | 'components', Row[]>>;
}

/** Single-phase motors as a nameplate might read: a little under the NEC 430.248 table values. */
const nameplates = [
  { volts: 115, amps: 6.8, horsepower: 1 / 3, phase: 1, rpm: 1725 },
  { volts: 115, amps: 9.2, horsepower: 1 / 2, phase: 1, rpm: 1725 },
  { volts: 230, amps: 4.6, horsepower: 1 / 2, phase: 1, rpm: 1725 },
];

const UNDISCIPLINED = [3, 17, 42];
const WATER = 24;

/** Chains, regions, 45 stores, 140 units and their parts, all from one seeded stream. */
export function makeWorld(random: () => number, today: CalendarDate): World {
  const id = () => namedId(random);
  const chainIds = chains.map(id);
  const regionIds = regions.map(id);
  const worldStores: WorldStore[] = [];
  const units: WorldUnit[] = [];
  const parts: WorldPart[] = [];
  const rows: World['rows'] = {
    chains: chains.map((name, index) => ({ id: chainIds[index], name })),
    regions: regions.map((name, index) => ({ id: regionIds[index], name })),
    stores: [],
    units: [],
    components: [],
  };

  stores.forEach((place, index) => {
    const zip = lookup(place.postalCode);
    if (!zip) throw new Error(`Unknown ZIP code ${place.postalCode}`);
    const chain = index % chains.length;
    const store: WorldStore = {
      id: id(),
      number: String((chain + 1) * 100 + 1 + Math.floor(index / chains.length)).padStart(4, '0'),
      name: place.name,
      chain,
      region: regions.indexOf(place.region),
      timeZone: tzLookup(zip.latitude, zip.longitude),
      discipline: UNDISCIPLINED.includes(index) ? 0.62 : 0.86 + 0.13 * random(),
      letWaterIn: index === WATER,
    };
    worldStores.push(store);
    rows.stores.push({
      id: store.id,
      chain_id: chainIds[chain],
      region_id: regionIds[store.region],
      number: store.number,
      name: store.name,
      address_line: `${100 + Math.floor(random() * 8900)} ${place.name}`,
      city: place.city,
      state: place.state,
      postal_code: place.postalCode,
      latitude: zip.latitude,
      longitude: zip.longitude,
      position_from: 'postal-code',
      time_zone: store.timeZone,
      phone: `555-01${String(index).padStart(2, '0')}`,
      access_note: accessNotes[index % accessNotes.length],
      hours: { open: '06:00', close: '23:00', rush: rushes[index % rushes.length] },
    });
    const count = 3 + (index % 9 === 0 ? 1 : 0);
    for (let nth = 1; nth <= count; nth += 1) {
      const portable = nth === count && index % 7 === 3;
      addUnit(store, portable ? 'P-1' : `F-${nth}`, portable ? 'portable' : 'built-in');
    }
  });

  function addUnit(store: WorldStore, tag: string, kind: 'built-in' | 'portable'): void {
    const unit: WorldUnit = {
      id: id(),
      store,
      tag,
      face: random() < 0.7 ? 'drain-slot' : 'gasket',
    };
    const installed = addDays(today, -Math.floor(720 + 900 * random()));
    units.push(unit);
    rows.units.push({
      id: unit.id,
      store_id: store.id,
      tag,
      kind,
      vats: kind === 'portable' ? 1 : 2 + Math.floor(random() * 3),
      oil_pounds: kind === 'portable' ? 75 : 50,
      model: kind === 'portable' ? 'Caddy 75' : 'Line 50',
      installed_on: installed,
    });
    for (const part of ['pump', 'motor', 'pan', 'hose'] as const) {
      const made: WorldPart = { id: id(), unit, kind: part };
      parts.push(made);
      rows.components.push({
        id: made.id,
        unit_id: unit.id,
        kind: part,
        serial_number: `${part.slice(0, 2).toUpperCase()}${Math.floor(random() * 1e6)}`,
        model: part === 'pump' ? 'Gear 8 gpm' : '',
        nameplate: part === 'motor' ? nameplates[Math.floor(random() * nameplates.length)] : {},
        pump_face: part === 'pump' ? unit.face : null,
        installed_on: installed,
      });
    }
  }
  return { chainIds, regionIds, stores: worldStores, units, parts, rows };
}

const accessNotes = [
  'Side door, ask for the shift lead.',
  'Loading dock until 10:00, then front door.',
  'Ring the bell at the back; keys with the manager.',
];

const rushes = [
  [{ from: '11:00', to: '13:30' }],
  [
    { from: '11:30', to: '13:00' },
    { from: '17:00', to: '19:30' },
  ],
];
