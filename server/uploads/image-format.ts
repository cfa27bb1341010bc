export type PhotoFormat = 'jpeg' | 'png' | 'webp';

/**
 * What a file is by its first bytes, whatever its name or type claim; null for everything that we
 * do not take. JPEG: ITU-T T.81 annex B (SOI, then a marker). PNG: W3C PNG section 5.2. WebP: RFC 9649
 * section 2.4.
 */
export function imageFormat(bytes: Uint8Array): PhotoFormat | null {
  const begins = (signature: readonly number[], at = 0) =>
    signature.every((byte, index) => bytes[at + index] === byte);
  if (begins([0xff, 0xd8, 0xff])) return 'jpeg';
  if (begins([0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a, 0x1a, 0x0a])) return 'png';
  if (begins(ascii('RIFF')) && begins(ascii('WEBP'), 8)) return 'webp';
  return null;
}

/** Whether a file is of the HEIF family that phones make and we cannot read; worth a word of its own. */
export function isHeif(bytes: Uint8Array): boolean {
  const brand = String.fromCharCode(...bytes.subarray(4, 12));
  return /^ftyp(heic|heix|heim|heis|hevc|hevx|mif1|msf1)$/.test(brand);
}

const ascii = (text: string) => [...text].map((letter) => letter.charCodeAt(0));
