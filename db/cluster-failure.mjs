/** A failure whose message is one line that tells a person what to do; shown without a stack. */
export class Failure extends Error {
  name = 'Failure';
}

const causes = [
  [
    /ENOSPC|No space left on device|disk quota exceeded|EDQUOT/i,
    'the disk is full. Free some space and start again.',
  ],
  [
    /Address already in use|EADDRINUSE/i,
    'its port is taken by another program. Choose other ports with PORT=….',
  ],
  [
    /EACCES|EPERM|EROFS|Permission denied|Operation not permitted|Read-only file system/i,
    'this user lacks the permission. Check who owns the clone and its .local folder.',
  ],
  [
    /ENOTFOUND|EAI_AGAIN|ECONNREFUSED|ECONNRESET|ETIMEDOUT|ENETUNREACH|Temporary failure resolving|Could not resolve|Failed to fetch|network (request|connectivity)/i,
    'the network does not answer. Check the connection and the proxy settings.',
  ],
];

/**
 * Turns what a program printed, or an error, into one line.
 * @param {string} what the step that failed, as the start of a sentence
 * @param {unknown} output the program's output or the error thrown
 * @param {string} [log] file that holds the whole output
 */
export function failureOf(what, output, log) {
  if (output instanceof Failure) return output;
  const text =
    output instanceof Error
      ? `${/** @type {any} */ (output).code ?? ''} ${output.message}`
      : String(output);
  const cause = causes.find(([pattern]) => pattern.test(text))?.[1];
  const lines = text.split('\n').map((line) => line.trim());
  const told = cause ?? (lines.filter(Boolean).at(-1) || 'it ended without a word');
  return new Failure(`${what}: ${told}${log && !cause ? ` (all of it: ${log})` : ''}`);
}
