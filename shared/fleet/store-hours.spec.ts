import { hoursOfDay, isRush, type StoreHours, storeHours } from './store-hours';

const hours: StoreHours = {
  open: '06:00',
  close: '01:00',
  rush: [{ from: '11:00', to: '13:30' }],
  byDay: { SU: null, SA: { open: '08:00', close: '22:00', rush: [] } },
};

describe('store hours', () => {
  it('take a day’s own hours before the usual ones', () => {
    expect(hoursOfDay(hours, 'MO')).toEqual({ open: '06:00', close: '01:00', rush: hours.rush });
    expect(hoursOfDay(hours, 'SA')?.open).toBe('08:00');
    expect(hoursOfDay(hours, 'SU')).toBeNull();
  });

  it('count the beginning of a rush in and its end out', () => {
    expect(isRush(hours, 'MO', '11:00')).toBe(true);
    expect(isRush(hours, 'MO', '13:30')).toBe(false);
    expect(isRush(hours, 'SA', '11:00')).toBe(false);
    expect(isRush(hours, 'SU', '11:00')).toBe(false);
  });

  it('refuse a rush that ends before it begins, and seconds', () => {
    const rush = [{ from: '13:00', to: '11:00' }];
    expect(storeHours.safeParse({ ...hours, rush }).error?.issues[0]?.path).toEqual([
      'rush',
      0,
      'to',
    ]);
    expect(storeHours.safeParse({ ...hours, open: '06:00:30' }).success).toBe(false);
  });
});
