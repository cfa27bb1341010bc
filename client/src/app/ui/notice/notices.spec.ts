import { TestBed } from '@angular/core/testing';
import { Notices } from './notices';

describe('Notices', () => {
  let notices: Notices;

  beforeEach(() => {
    jest.useFakeTimers();
    notices = TestBed.inject(Notices);
  });
  afterEach(() => jest.useRealTimers());

  it('takes a plain notice away after six seconds', () => {
    notices.tell({ text: 'Saved' });
    jest.advanceTimersByTime(5999);
    expect(notices.current()?.text).toBe('Saved');
    jest.advanceTimersByTime(1);
    expect(notices.current()).toBeNull();
  });

  it('gives an undo more time, and holds it under the pointer', () => {
    notices.offerUndo('Store retired', () => undefined);
    jest.advanceTimersByTime(11000);
    notices.hold();
    jest.advanceTimersByTime(60000);
    expect(notices.current()).not.toBeNull();
    notices.resume();
    jest.advanceTimersByTime(12000);
    expect(notices.current()).toBeNull();
  });

  it('keeps a notice that stays', () => {
    notices.tell({ text: 'New version', stays: true });
    jest.advanceTimersByTime(3600000);
    expect(notices.current()).not.toBeNull();
    notices.dismiss();
    expect(notices.current()).toBeNull();
  });
});
