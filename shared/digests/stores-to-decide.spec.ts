import { onTimeRate } from '../compliance/on-time-rate';
import { storesToDecide } from './stores-to-decide';

const store = (number: string, onTime: number, notDone: number) => {
  const counts = { onTime, late: 0, notDone, excused: 0, covered: 0 };
  return { storeId: number, number, name: '', counts, rate: onTimeRate(counts), change: null };
};

describe('stores put before the account owner', () => {
  it('lists those under four of five, lowest first, where enough windows closed', () => {
    const stores = [
      store('0101', 4, 1),
      store('0102', 3, 2),
      store('0103', 1, 1),
      store('0104', 0, 0),
      store('0105', 1, 9),
    ];
    expect(storesToDecide(stores).map(({ number }) => number)).toEqual(['0105', '0102']);
  });
});
