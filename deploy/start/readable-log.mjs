const words = { 10: 'trace', 20: 'debug', 30: 'info', 40: 'warn', 50: 'error', 60: 'fatal' };
const plain = new Set(['level', 'time', 'msg', 'pid', 'hostname', 'err', 'req', 'res']);

/**
 * A JSON log line as a line for people; anything else as it is.
 * @returns {{text: string, grave: boolean}} grave: an error or worse
 */
export function readable(line) {
  const entry = parse(line);
  if (!entry || typeof entry.level !== 'number') return { text: line, grave: false };
  const { level, time, msg = '', err, req, res } = entry;
  const parts = [
    new Date(time).toISOString().slice(11, 23),
    words[level] ?? level,
    req && `${req.method} ${req.url}`,
    res && res.statusCode,
    msg,
    ...Object.entries(entry)
      .filter(([name]) => !plain.has(name))
      .map(([name, value]) => `${name}=${JSON.stringify(value)}`),
    err && (err.stack ?? err.message),
  ];
  return {
    text: parts.filter((it) => it !== undefined && it !== '').join(' '),
    grave: level >= 50,
  };
}

function parse(line) {
  if (!line.startsWith('{')) return undefined;
  try {
    return JSON.parse(line);
  } catch {
    return undefined;
  }
}
