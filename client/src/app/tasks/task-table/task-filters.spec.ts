import { shownStates, statesInAddress, tableFilters } from './task-filters';

const address = (query: string) => {
  const params = new URLSearchParams(query);
  return (key: string): string => params.get(key) ?? '';
};

describe('shownStates', () => {
  it('shows what is to be done when nothing is asked for', () => {
    expect([...shownStates(address(''))]).toEqual(['open', 'due-soon', 'overdue']);
  });

  it('shows every state of a span of days and of a figure of compliance', () => {
    expect(shownStates(address('from=2026-03-01')).size).toBe(0);
    expect(shownStates(address('end=late&closesFrom=2026-03-01')).size).toBe(0);
  });

  it('takes what is asked for and drops what is no state', () => {
    expect([...shownStates(address('from=2026-03-01&state=missed,nonsense,done'))]).toEqual([
      'done',
      'missed',
    ]);
    expect(shownStates(address('state=all')).size).toBe(0);
  });
});

describe('statesInAddress', () => {
  it('leaves the usual choice out and says all', () => {
    expect(statesInAddress(['overdue', 'open', 'due-soon'])).toBeNull();
    expect(statesInAddress([])).toBe('all');
    expect(statesInAddress(['missed'])).toBe('missed');
  });
});

describe('tableFilters', () => {
  it('asks the server for nothing that is not set', () => {
    const filters = tableFilters(address('store=s1&state=all'));
    expect(Object.entries(filters).filter(([, value]) => value !== undefined)).toEqual([
      ['store', 's1'],
    ]);
  });

  it('gives lists as lists', () => {
    expect(tableFilters(address('end=late,notDone'))).toMatchObject({
      end: ['late', 'notDone'],
      state: undefined,
    });
  });
});
