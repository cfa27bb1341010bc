import tzLookup from '@photostructure/tz-lookup';
import { lookup } from 'zipcodes';
import { type CalendarDate, addDays } from '@shared/calendar/calendar-date';
import { stores as towns } from '../world/places';
import { namedId } from '../world/random';

const STORES_OF_A_REGION = 150;
const UNITS_OF_A_STORE = 6;
const CHAINS = 4;

type Row = Readonly<Record<string, unknown>>;

export interface FleetStore {
  readonly id: string;
  readonly number: string;
  readonly regionId: string;
  readonly timeZone: string;
}

export interface FleetPlaces {
  readonly chainIds: readonly string[];
  readonly regionIds: readonly string[];
  readonly stores: readonly FleetStore[];
  readonly rows: Readonly<Record<'chains' | 'regions' | 'stores' | 'units' | 'components', Row[]>>;
}

const nameplate = { volts: 115, amps: 6.8, horsepower: 1 / 3, phase: 1, rpm: 1725 };

/** So many stores around the demo world's towns, six units each, all from one seeded stream. */
export function fleetPlaces(count: number, random: () => number, today: CalendarDate): FleetPlaces {
  const id = () => namedId(random);
  const chainIds = Array.from({ length: CHAINS }, id);
  const regionIds = Array.from({ length: Math.ceil(count / STORES_OF_A_REGION) }, id);
  const rows: FleetPlaces['rows'] = {
    chains: chainIds.map((it, index) => ({ id: it, name: `Chain ${index + 1}` })),
    regions: regionIds.map((it, index) => ({ id: it, name: `Region ${index + 1}` })),
    stores: [],
    units: [],
    components: [],
  };
  const stores = Array.from({ length: count }, (_, index) => {
    const store = addStore(index);
    for (let nth = 1; nth <= UNITS_OF_A_STORE; nth += 1) addUnit(store.id, nth);
    return store;
  });
  return { chainIds, regionIds, stores, rows };

  function addStore(index: number): FleetStore {
    const region = Math.floor(index / STORES_OF_A_REGION);
    // Towns of a region lie together, so that its stores share a zone or two.
    const town = towns[(region * 7 + (index % 7)) % towns.length];
    const zip = lookup(town?.postalCode ?? '');
    if (!town || !zip) throw new Error('A town of the demo world has no ZIP code.');
    const latitude = zip.latitude + (random() - 0.5) * 0.4;
    const longitude = zip.longitude + (random() - 0.5) * 0.4;
    const store = {
      id: id(),
      number: String(index + 1).padStart(5, '0'),
      regionId: regionIds[region] as string,
      timeZone: tzLookup(latitude, longitude),
    };
    rows.stores.push({
      id: store.id,
      chain_id: chainIds[index % CHAINS],
      region_id: store.regionId,
      number: store.number,
      name: `${town.name} ${index + 1}`,
      city: town.city,
      state: town.state,
      postal_code: town.postalCode,
      latitude,
      longitude,
      position_from: 'coordinates',
      time_zone: store.timeZone,
    });
    return store;
  }

  function addUnit(storeId: string, nth: number): void {
    const portable = nth === UNITS_OF_A_STORE;
    const unitId = id();
    const installed_on = addDays(today, -Math.floor(400 + 1200 * random()));
    rows.units.push({
      id: unitId,
      store_id: storeId,
      tag: portable ? 'P-1' : `F-${nth}`,
      kind: portable ? 'portable' : 'built-in',
      vats: portable ? 1 : 2 + Math.floor(random() * 3),
      oil_pounds: portable ? 75 : 50,
      model: portable ? 'Caddy 75' : 'Line 50',
      installed_on,
    });
    for (const kind of ['pump', 'motor', 'pan', 'hose']) {
      rows.components.push({
        id: id(),
        unit_id: unitId,
        kind,
        serial_number: `${kind.slice(0, 2).toUpperCase()}${Math.floor(random() * 1e7)}`,
        nameplate: kind === 'motor' ? nameplate : {},
        pump_face: kind === 'pump' ? (random() < 0.7 ? 'drain-slot' : 'gasket') : null,
        installed_on,
      });
    }
  }
}
