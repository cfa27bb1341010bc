import { backOffSeconds, outcomeOf } from './delivery-outcome';

const failure = (code: string, responseCode?: number) =>
  Object.assign(new Error(`${code} ${responseCode}`), { code, responseCode });

describe('what an SMTP failure means', () => {
  // RFC 5321, 4.2.1: 4yz is transient, 5yz is permanent.
  it('is final only when a 5xx answers the envelope or the text', () => {
    expect(outcomeOf(failure('EENVELOPE', 550)).kind).toBe('refused');
    expect(outcomeOf(failure('EMESSAGE', 554)).kind).toBe('refused');
    expect(outcomeOf(failure('EENVELOPE', 450))).toMatchObject({ kind: 'later', fault: 'letter' });
  });

  it('blames the server for everything that happens before the envelope', () => {
    for (const it of [failure('EAUTH', 535), failure('ECONNECTION'), failure('EPROTOCOL', 554)]) {
      expect(outcomeOf(it)).toMatchObject({ kind: 'later', fault: 'server' });
    }
  });

  it('waits longer each time, up to half an hour', () => {
    expect([1, 2, 3, 6, 20, 500].map(backOffSeconds)).toEqual([60, 120, 240, 1800, 1800, 1800]);
  });
});
