import sharp from 'sharp';
import { photoLimits } from '@shared/uploads/photo-limits';
import { Problem } from '@shared/problem';
import { imageFormat, isHeif } from './image-format';

// Only the three decoders that photos need: whatever a file claims to be, no other code reads it.
sharp.block({ operation: ['VipsForeignLoad'] });
sharp.unblock({
  operation: ['VipsForeignLoadJpegBuffer', 'VipsForeignLoadPngBuffer', 'VipsForeignLoadWebpBuffer'],
});
sharp.cache(false);

export interface Picture {
  readonly bytes: Buffer;
  readonly width: number;
  readonly height: number;
}

/** A photo as it is kept: upright JPEG without any metadata, and a small one for lists. */
export interface EncodedPhoto {
  readonly full: Picture;
  readonly thumbnail: Picture;
}

const refused = (code: string, title: string) => new Problem(422, code, title);

/**
 * Decodes a photo and writes it anew, so that nothing of the file sent survives but its pixels:
 * place and device are gone, and so is anything hidden behind or between the picture's own data.
 * @throws Problem 422 for what is no JPEG, PNG or WebP, is damaged or has too many pixels
 */
export async function reEncodePhoto(sent: Buffer): Promise<EncodedPhoto> {
  if (isHeif(sent)) {
    throw refused('photo-heic', 'HEIC photos cannot be read. Set the camera to JPEG.');
  }
  const format = imageFormat(sent);
  if (!format) throw refused('photo-type', 'Only JPEG, PNG and WebP photos can be kept.');
  try {
    const full = await smaller(sent, photoLimits.side, 82);
    return { full, thumbnail: await smaller(full.bytes, photoLimits.thumbnailSide, 72) };
  } catch (cause) {
    const tooLarge = cause instanceof Error && /pixel limit/i.test(cause.message);
    throw Object.assign(
      tooLarge
        ? refused('photo-pixels', 'This picture has too many pixels.')
        : refused('photo-damaged', 'This photo is damaged and cannot be read.'),
      { cause },
    );
  }
}

async function smaller(bytes: Buffer, side: number, quality: number): Promise<Picture> {
  const { data, info } = await sharp(bytes, {
    limitInputPixels: photoLimits.pixels,
    failOn: 'error',
    sequentialRead: true,
  })
    .autoOrient()
    .resize({ width: side, height: side, fit: 'inside', withoutEnlargement: true })
    // See-through parts of a PNG would turn black.
    .flatten({ background: '#ffffff' })
    .toColourspace('srgb')
    .jpeg({ quality, progressive: true })
    .timeout({ seconds: 10 })
    .toBuffer({ resolveWithObject: true });
  return { bytes: data, width: info.width, height: info.height };
}
