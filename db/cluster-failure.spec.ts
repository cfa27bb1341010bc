import { Failure, failureOf } from './cluster-failure.mjs';

describe('failureOf', () => {
  const line = (output: unknown) => failureOf('Making the database', output, '/tmp/log').message;

  it.each([
    ['initdb: error: could not write: No space left on device', 'the disk is full'],
    ['npm error code ENOSPC', 'the disk is full'],
    [Object.assign(new Error('open failed'), { code: 'EACCES' }), 'lacks the permission'],
    ['could not bind IPv4 address: Address already in use', 'port is taken'],
    ['npm error request failed, reason: getaddrinfo ENOTFOUND registry', 'network does not answer'],
  ])('names the cause of %s', (output, cause) => {
    expect(line(output)).toContain(cause);
  });

  it('tells the last thing said, and where the rest is, when it knows no cause', () => {
    expect(line('one\n  two \n\n')).toBe('Making the database: two (all of it: /tmp/log)');
  });

  it('is always one line', () => {
    expect(line(new Error('first\nsecond'))).not.toContain('\n');
    expect(line('')).not.toContain('\n');
  });

  it('leaves a failure that is told already as it is', () => {
    const told = new Failure('Port 1 is taken.');
    expect(failureOf('Starting', told)).toBe(told);
  });
});
