import { gridMove } from './grid-keys';

const key = (name: string, ctrlKey = false) => ({ key: name, ctrlKey });

describe('gridMove', () => {
  const move = (name: string, row: number, column: number, ctrl = false) =>
    gridMove({ row, column }, key(name, ctrl), 12, 35, 10);

  it('moves cell by cell', () => {
    expect(move('ArrowRight', 2, 3)).toEqual({ row: 2, column: 4 });
    expect(move('ArrowLeft', 2, 3)).toEqual({ row: 2, column: 2 });
    expect(move('ArrowDown', 2, 3)).toEqual({ row: 3, column: 3 });
    expect(move('ArrowUp', 2, 3)).toEqual({ row: 1, column: 3 });
  });

  it('stays inside', () => {
    expect(move('ArrowUp', 0, 0)).toEqual({ row: 0, column: 0 });
    expect(move('ArrowRight', 0, 34)).toEqual({ row: 0, column: 34 });
    expect(move('PageDown', 5, 1)).toEqual({ row: 11, column: 1 });
  });

  it('goes to the ends of the row, and with Control of the grid', () => {
    expect(move('Home', 4, 9)).toEqual({ row: 4, column: 0 });
    expect(move('End', 4, 9)).toEqual({ row: 4, column: 34 });
    expect(move('Home', 4, 9, true)).toEqual({ row: 0, column: 0 });
    expect(move('End', 4, 9, true)).toEqual({ row: 11, column: 34 });
  });

  it('leaves other keys alone', () => {
    expect(move('Enter', 4, 9)).toBeNull();
    expect(move('a', 4, 9)).toBeNull();
  });
});
