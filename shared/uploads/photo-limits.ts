/** What a photo may be. The client makes photos smaller before it sends them; the server insists. */
export const photoLimits = {
  /** Bytes of the file sent: what a phone's camera makes, with room to spare. */
  bytes: 15_000_000,
  /** Pixels of the picture sent; a small file can unfold into gigabytes. */
  pixels: 50_000_000,
  /** Longest side kept, in pixels. */
  side: 2048,
  /** Longest side of the small picture in lists, in pixels. */
  thumbnailSide: 320,
  /** Photos that one person may send within a day. */
  perDay: 400,
  types: ['image/jpeg', 'image/png', 'image/webp'],
} as const;
