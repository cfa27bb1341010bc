import { onTimeRate, type WindowCounts } from '../compliance/on-time-rate';
import type { DigestContent } from './digest-content';

const counts = (onTime: number, late: number, notDone: number, excused = 0, covered = 0) => {
  const all: WindowCounts = { onTime, late, notDone, excused, covered };
  return { counts: all, rate: onTimeRate(all) };
};

const unionDepot = {
  storeId: '5b0c7b7e-2f0a-4f5e-9d52-3f6d7b1c2a90',
  number: '0142',
  name: 'Union Depot',
};
const cedarFalls = {
  storeId: '6c1d8c8f-3a1b-4a6f-8e63-4a7e8c2d3ba1',
  number: '0107',
  name: 'Cedar Falls Rd',
};

/** An invented month, to look at the letter and to hold it to what all letters must keep. */
export const digestSample: DigestContent = {
  shape: 1,
  chainName: 'Kettle & Flue',
  month: '2026-11',
  ...counts(60, 6, 4, 2, 3),
  previousRate: 0.882,
  change: -2.5,
  months: [
    { month: '2026-09', ...counts(63, 5, 2) },
    { month: '2026-10', ...counts(60, 5, 3) },
    { month: '2026-11', ...counts(60, 6, 4, 2, 3) },
  ],
  stores: [
    { ...unionDepot, ...counts(24, 4, 4), change: -8.3 },
    { ...cedarFalls, ...counts(36, 2, 0, 2, 3), change: 2.1 },
  ],
  overdue: { count: 3, stores: [{ ...unionDepot, count: 3, oldestClosedOn: '2026-11-18' }] },
  findings: {
    count: 5,
    unsettled: 2,
    byCause: [
      { cause: 'clogged-paper', count: 3, stop: 0, unsettled: 1 },
      { cause: 'worn-seal', count: 2, stop: 1, unsettled: 1 },
    ],
  },
  repairs: { count: 1, partsCents: 18_450, labourCents: 9_500 },
  stopped: [
    {
      ...unionDepot,
      findingId: '7d2e9d90-4b2c-4b70-9f74-5b8f9d3e4cb2',
      unitTag: 'F-2',
      cause: 'worn-seal',
      foundOn: '2026-11-21',
    },
  ],
};
