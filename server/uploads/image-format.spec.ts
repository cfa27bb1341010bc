import { imageFormat, isHeif } from './image-format';

const bytes = (text: string) => Buffer.from(text, 'latin1');

describe('the format of an image', () => {
  it('is read from its first bytes', () => {
    expect(imageFormat(bytes('\xff\xd8\xff\xe0rest'))).toBe('jpeg');
    expect(imageFormat(bytes('\x89PNG\r\n\x1a\nrest'))).toBe('png');
    expect(imageFormat(bytes('RIFF\x00\x00\x00\x00WEBPVP8 '))).toBe('webp');
  });

  it.each(['', '<svg xmlns="http://www.w3.org/2000/svg"/>', 'GIF89a', '%PDF-1.7', 'RIFF0000WAVE'])(
    'is nothing we take: %j',
    (text) => expect(imageFormat(bytes(text))).toBeNull(),
  );

  it('knows the family of HEIC', () => {
    expect(isHeif(bytes('\x00\x00\x00\x18ftypheic'))).toBe(true);
    expect(isHeif(bytes('\x00\x00\x00\x18ftypisom'))).toBe(false);
  });
});
