import type { Store } from '../fleet-api';
import { bodyOfStore, storeBody, storeForm } from './store-form-model';

const store: Store = {
  id: 'a',
  version: 3,
  number: '0114',
  name: 'Cedar Falls Rd',
  chainId: 'c',
  chainName: 'Chain',
  regionId: 'r',
  regionName: 'Region',
  addressLine: '1 Cedar Falls Rd',
  city: 'Phoenix',
  usState: 'AZ',
  postalCode: '85004',
  latitude: 33.45,
  longitude: -112.07,
  positionFrom: 'postal-code',
  timeZone: 'America/Phoenix',
  timeZoneOfPosition: 'America/Phoenix',
  phone: '',
  accessNote: '',
  hours: {
    open: '06:00',
    close: '01:00',
    rush: [{ from: '11:00', to: '13:30' }],
    byDay: { SU: null, SA: { open: '08:00', close: '22:00', rush: [] } },
  },
  units: 2,
  openFindings: 0,
  retiredAt: null,
  mayEdit: true,
};

describe('the form of a store', () => {
  it('sends a week back as it came', () => {
    expect(bodyOfStore(store).hours).toEqual(store.hours);
  });

  it('leaves to the server what came from the ZIP code', () => {
    expect(bodyOfStore(store)).toMatchObject({ position: null, timeZone: null });
  });

  it('keeps a position that was given and a zone that differs from it', () => {
    const own = { ...store, positionFrom: 'coordinates' as const, timeZone: 'America/Denver' };
    expect(bodyOfStore(own)).toMatchObject({
      position: { latitude: 33.45, longitude: -112.07 },
      timeZone: 'America/Denver',
    });
  });

  it('refuses a rush that ends before it begins', () => {
    const form = storeForm(store);
    form.controls.hours.controls.rush.at(0).setValue({ from: '13:00', to: '11:00' });
    expect(form.valid).toBe(false);
  });

  it('names no day apart when all are as usual', () => {
    const form = storeForm({ ...store, hours: { open: null, close: null, rush: [] } });
    expect(storeBody(form).hours).toEqual({ open: null, close: null, rush: [] });
  });
});
