import { cellSigns, countWords, totalOf } from './state-counts';

describe('cellSigns', () => {
  it('draws up to three tasks one by one, the most urgent first', () => {
    expect(cellSigns({ done: 2, overdue: 1 })).toEqual({
      signs: ['overdue', 'done', 'done'],
      count: 0,
    });
  });

  it('draws the most urgent and the number of more', () => {
    expect(cellSigns({ done: 11, 'due-soon': 1 })).toEqual({ signs: ['due-soon'], count: 12 });
  });

  it('draws nothing for nothing', () => {
    expect(cellSigns({})).toEqual({ signs: [], count: 0 });
    expect(totalOf({})).toBe(0);
  });
});

describe('countWords', () => {
  it('says how many in each state', () => {
    expect(countWords({ done: 12, overdue: 1 }, 'en')).toBe('1 overdue, 12 done');
  });
});
