import { pipeline } from 'node:stream/promises';
import type { Request, Response } from 'express';
import { forbidden, notFound } from '@shared/problem';
import { Binds } from '@db/binds';
import type { Tenant } from '@db/tenant-transaction';
import type { Actor } from '../access/actor';
import { visibleStores } from '../access/visible-stores';
import type { Services } from '../http/services';
import { FileStore } from './file-store';

interface PhotoRow {
  storageKey: string;
  thumbnailKey: string;
}

/**
 * Finds a photo for whoever may read tasks of its store, and gives back how to send it: as an image
 * and nothing else, to our own pages only. The browser may keep it but asks every time whether the
 * person may still see it; a photo never changes under its id, so the answer is mostly 304.
 * @throws Problem 404 when it does not exist or lies out of the actor's sight, 403 for other sites
 */
export async function photoSender(
  tenant: Tenant,
  actor: Actor,
  services: Services,
  req: Request,
  id: string,
  size: 'full' | 'thumbnail',
): Promise<(res: Response) => Promise<void>> {
  const site = req.get('Sec-Fetch-Site');
  if (site !== undefined && site !== 'same-origin' && site !== 'none') throw forbidden();
  const binds = new Binds();
  const photo = await tenant.row<PhotoRow>(
    `SELECT u.storage_key AS "storageKey", u.thumbnail_key AS "thumbnailKey"
     FROM uploads u JOIN stores s ON s.id = u.store_id
     WHERE u.id = ${binds.add(id)} AND u.purpose = 'photo'
       AND ${visibleStores(actor, 'tasks.read', binds)}`,
    binds.values,
  );
  if (!photo) throw notFound('photo');
  return async (res) => {
    res.set({
      'Cache-Control': 'private, no-cache',
      'Content-Security-Policy': "default-src 'none'; sandbox",
      'Content-Disposition': `inline; filename="photo-${id}.jpg"`,
      ETag: `"${id}-${size}"`,
    });
    res.type('image/jpeg');
    if (req.fresh) {
      res.status(304).end();
      return;
    }
    const key = size === 'full' ? photo.storageKey : photo.thumbnailKey;
    await pipeline(await new FileStore(services).open(key), res);
  };
}
