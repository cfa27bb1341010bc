import { type TaskState, taskState } from './task-state';

const times = { opensAt: 10, dueSoonAt: 20, closesAt: 30, lapsesAt: 40 };

describe('task state', () => {
  it.each<[number, TaskState]>([
    [9, 'planned'],
    [10, 'open'],
    [19, 'open'],
    [20, 'due-soon'],
    [29, 'due-soon'],
    [30, 'overdue'],
    [39, 'overdue'],
    [40, 'missed'],
  ])('at %d an undecided task is %s', (now, state) => {
    expect(taskState('none', null, times, now)).toBe(state);
  });

  it('is done within the window and done late from its end on', () => {
    expect(taskState('done', 29, times, 99)).toBe('done');
    expect(taskState('done', 30, times, 99)).toBe('done-late');
  });

  it('keeps a decision whatever the clock says', () => {
    for (const now of [0, 25, 99]) {
      expect(taskState('excused', null, times, now)).toBe('excused');
      expect(taskState('covered', null, times, now)).toBe('covered');
    }
  });
});
