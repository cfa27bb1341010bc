import { readable } from './readable-log.mjs';

const time = Date.parse('2026-03-08T14:05:06.007Z');

describe('readable', () => {
  it('turns a JSON line into words', () => {
    const line = JSON.stringify({ level: 30, time, pid: 1, msg: 'server listening', port: 4310 });
    expect(readable(line)).toEqual({
      text: '14:05:06.007 info server listening port=4310',
      grave: false,
    });
  });

  it('shows the request, the status and the stack of an error, and calls it grave', () => {
    const line = JSON.stringify({
      level: 50,
      time,
      msg: 'request errored',
      req: { method: 'GET', url: '/api/v1/stores' },
      res: { statusCode: 500 },
      err: { message: 'no', stack: 'Error: no\n    at here' },
    });
    expect(readable(line)).toEqual({
      text: '14:05:06.007 error GET /api/v1/stores 500 request errored Error: no\n    at here',
      grave: true,
    });
  });

  it.each(['Error: plain text', '{ not json', '{"level":"high"}', ''])('passes on %j', (line) => {
    expect(readable(line)).toEqual({ text: line, grave: false });
  });
});
