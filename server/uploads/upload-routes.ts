import {
  addPhoto as addPhotoEndpoint,
  readPhoto,
  readThumbnail,
} from '@shared/uploads/uploads-contract';
import type { Routes } from '../http/routes';
import { addPhoto } from './add-photo';
import { receivePhoto } from './receive-photo';
import { photoSender } from './send-photo';

export function uploadRoutes(routes: Routes): void {
  const { services } = routes;

  routes.upload(addPhotoEndpoint, receivePhoto, ({ tenant, actor, params, received }) =>
    addPhoto(tenant, actor, services, params, received),
  );

  routes.download(readPhoto, ({ tenant, actor, req, params }) =>
    photoSender(tenant, actor, services, req, params.id, 'full'),
  );

  routes.download(readThumbnail, ({ tenant, actor, req, params }) =>
    photoSender(tenant, actor, services, req, params.id, 'thumbnail'),
  );
}
