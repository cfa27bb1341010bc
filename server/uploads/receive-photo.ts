import type { Request } from 'express';
import multer, { MulterError } from 'multer';
import { photoLimits } from '@shared/uploads/photo-limits';
import { Problem, invalid } from '@shared/problem';
import { atMost } from '../sign-in/at-most';
import { type EncodedPhoto, reEncodePhoto } from './re-encode-photo';

const parse = multer({
  storage: multer.memoryStorage(),
  limits: { fileSize: photoLimits.bytes, files: 1, fields: 0, parts: 1, headerPairs: 20 },
}).single('photo');

/** A photo unfolds to some hundred megabytes while it is decoded. */
const decoding = atMost(2, 24);

/**
 * Reads the one photo of a multipart request and writes it anew.
 * @throws Problem 413 when it is too large, 422 when it is missing or no photo, 503 in a crowd
 */
export async function receivePhoto(req: Request): Promise<EncodedPhoto> {
  await new Promise<void>((done, fail) => {
    parse(req, req.res as never, (error: unknown) => (error ? fail(asProblem(error)) : done()));
  });
  const { file } = req;
  if (!file) {
    throw invalid([{ field: 'photo', reason: 'required', message: 'Send a photo.' }]);
  }
  return decoding(() => reEncodePhoto(file.buffer));
}

function asProblem(error: unknown): Problem {
  if (error instanceof MulterError && error.code === 'LIMIT_FILE_SIZE') {
    return new Problem(413, 'too-large', 'This photo is too large.');
  }
  return new Problem(400, 'malformed', 'The request could not be read.');
}
