import type { Request, Response } from 'express';
import multer, { MulterError } from 'multer';
import { Problem, invalid } from '@shared/problem';

/** A file as it came; its name and type are what the sender says, and nothing relies on them. */
export interface ReceivedFile {
  readonly name: string;
  readonly bytes: Buffer;
}

/** Files being received are held in memory, so only so many at a time. */
const AT_ONCE = 6;
let receiving = 0;

const missing = (message: string) => invalid([{ field: 'file', reason: 'needed', message }]);

/**
 * Reads the one part `file` of a multipart form.
 * @param maxBytes a longer file is refused as soon as that shows
 * @throws Problem 413 when too large, 415 when no form came, 422 without a file, 503 when busy.
 */
export async function receiveFile(req: Request, maxBytes: number): Promise<ReceivedFile> {
  if (!req.is('multipart/form-data')) {
    throw new Problem(415, 'not-a-form', 'Send the file as a form.');
  }
  if (receiving >= AT_ONCE) {
    throw new Problem(503, 'busy', 'Many files are being received just now. Try again shortly.');
  }
  const read = multer({
    storage: multer.memoryStorage(),
    defParamCharset: 'utf8',
    limits: { fileSize: maxBytes, files: 1, fields: 0, parts: 1, headerPairs: 20 },
  }).single('file');
  receiving += 1;
  try {
    await new Promise<void>((done, fail) =>
      read(req, req.res as Response, (error?: unknown) =>
        error ? fail(asProblem(error, maxBytes)) : done(),
      ),
    );
  } finally {
    receiving -= 1;
  }
  if (!req.file) throw missing('Choose a file.');
  if (req.file.size === 0) throw missing('This file is empty.');
  return { name: plainName(req.file.originalname), bytes: req.file.buffer };
}

function asProblem(error: unknown, maxBytes: number): Problem {
  if (error instanceof MulterError && error.code === 'LIMIT_FILE_SIZE') {
    const megabytes = Math.floor(maxBytes / 1_000_000);
    return new Problem(413, 'too-large', `A file may have ${megabytes} MB at most.`);
  }
  return new Problem(400, 'malformed', 'The form could not be read.');
}

/** A name to show: without folders and control characters, short. */
function plainName(name: string): string {
  const last = name.split(/[/\\]/).at(-1) ?? '';
  // Control characters would break lists and logs.
  // eslint-disable-next-line no-control-regex
  const shown = last.replace(/[\u0000-\u001f\u007f\u202a-\u202e\u2066-\u2069]/g, '').trim();
  return shown.slice(-120) || 'file';
}
