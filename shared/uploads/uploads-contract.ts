import * as z from 'zod';
import { endpoint } from '../contract/endpoint';

const photoParams = z.strictObject({ id: z.uuid() });

export const addPhoto = endpoint({
  method: 'PUT',
  path: '/stores/:storeId/photos/:id',
  summary: 'Send a photo (multipart, field "photo"); it is re-encoded and stripped of metadata',
  access: 'findings.report',
  params: z.strictObject({ storeId: z.uuid(), id: z.uuid() }),
  reply: z.strictObject({ id: z.uuid(), width: z.int(), height: z.int(), bytes: z.int() }),
});

export const readPhoto = endpoint({
  method: 'GET',
  path: '/photos/:id',
  summary: 'A photo as JPEG',
  access: 'tasks.read',
  params: photoParams,
  reply: z.undefined(),
});

export const readThumbnail = endpoint({
  method: 'GET',
  path: '/photos/:id/thumbnail',
  summary: 'A photo as a small JPEG',
  access: 'tasks.read',
  params: photoParams,
  reply: z.undefined(),
});

export const uploadEndpoints = [addPhoto, readPhoto, readThumbnail];
