import type { Month } from '@shared/compliance/month';
import { countedEnds, tasksBehind } from './tasks-behind';

const months = { from: '2026-01' as Month, to: '2026-02' as Month };

describe('the tasks behind a figure', () => {
  it('names how the windows ended, and the days from the first to the last of the months', () => {
    expect(tasksBehind(countedEnds, months, { store: 'a', region: '' })).toEqual({
      store: 'a',
      end: 'onTime,late,notDone',
      closesFrom: '2026-01-01',
      closesTo: '2026-02-28',
      sort: 'closes',
    });
  });
});
