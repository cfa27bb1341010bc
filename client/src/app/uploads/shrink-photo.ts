import { photoLimits } from '@shared/uploads/photo-limits';

/**
 * A photo as it is sent: upright JPEG within the longest side that the server keeps. Phones make
 * several megabytes, of which a slow line behind the fryer would carry ten times too many. What the
 * browser cannot read is sent as it is, and the server says what is wrong with it.
 */
export async function shrinkPhoto(photo: Blob): Promise<Blob> {
  try {
    const bitmap = await createImageBitmap(photo, { imageOrientation: 'from-image' });
    const scale = Math.min(1, photoLimits.side / Math.max(bitmap.width, bitmap.height));
    const canvas = document.createElement('canvas');
    canvas.width = Math.max(1, Math.round(bitmap.width * scale));
    canvas.height = Math.max(1, Math.round(bitmap.height * scale));
    const context = canvas.getContext('2d');
    if (!context) return photo;
    context.fillStyle = '#fff';
    context.fillRect(0, 0, canvas.width, canvas.height);
    context.drawImage(bitmap, 0, 0, canvas.width, canvas.height);
    bitmap.close();
    const smaller = await new Promise<Blob | null>((done) =>
      canvas.toBlob(done, 'image/jpeg', 0.85),
    );
    return smaller ?? photo;
  } catch {
    return photo;
  }
}
