import { daySpans } from './day-spans';

describe('daySpans', () => {
  it('places a plain day on a bar that begins at four', () => {
    expect(daySpans({ open: '10:00', close: '22:00', rush: [] }).open).toEqual({
      start: 25,
      width: 50,
    });
  });

  it('takes a close after midnight to the same bar', () => {
    const { open } = daySpans({ open: '16:00', close: '02:00', rush: [] });
    expect(open?.start).toBe(50);
    expect(open?.width).toBeCloseTo((10 / 24) * 100);
  });

  it('fills the bar of a store that never closes', () => {
    expect(daySpans({ open: '04:00', close: '04:00', rush: [] }).open).toEqual({
      start: 0,
      width: 100,
    });
  });

  it('shows a rush without hours, and nothing on a closed day', () => {
    const spans = daySpans({ open: null, close: null, rush: [{ from: '10:00', to: '13:00' }] });
    expect(spans).toEqual({ open: null, rush: [{ start: 25, width: 12.5 }] });
    expect(daySpans(null)).toEqual({ open: null, rush: [] });
  });
});
