import { randomUUID } from 'node:crypto';
import type { Fleet } from './organisation-factory';

let made = 0;

/** What a person would send to add a store to this chain and region. */
export const storeBody = (fleet: Fleet, more: object = {}) => ({
  id: randomUUID(),
  chainId: fleet.chainId,
  regionId: fleet.regionId,
  number: `N${(made += 1)}`,
  name: 'Mill Pond',
  addressLine: '12 Mill St',
  city: '',
  usState: '',
  postalCode: '85004',
  position: null,
  timeZone: null,
  phone: '',
  accessNote: 'Side door',
  hours: { open: '06:00', close: '23:00', rush: [{ from: '11:00', to: '13:30' }] },
  ...more,
});

/** What a person would send to add a unit to this store. */
export const unitBody = (storeId: string, more: object = {}) => ({
  id: randomUUID(),
  storeId,
  tag: `F-${(made += 1)}`,
  kind: 'built-in',
  vats: 3,
  oilPounds: 50,
  model: 'Line 50',
  installedOn: '2024-05-01',
  outOfServiceSince: null,
  components: [] as object[],
  ...more,
});

/** A part as it is fitted. */
export const partBody = (kind: string, more: object = {}) => ({
  id: randomUUID(),
  kind,
  serialNumber: `S-${(made += 1)}`,
  model: '',
  nameplate:
    kind === 'motor' ? { volts: 115, amps: 6.8, horsepower: 0.5, phase: 1, rpm: 1725 } : {},
  pumpFace: kind === 'pump' ? 'drain-slot' : null,
  installedOn: '2024-05-01',
  ...more,
});
