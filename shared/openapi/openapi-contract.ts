import * as z from 'zod';
import { endpoint } from '../contract/endpoint';

export const readApiDescription = endpoint({
  method: 'GET',
  path: '/openapi.json',
  summary: 'This description',
  access: 'public',
  reply: z.looseObject({ openapi: z.string(), paths: z.record(z.string(), z.unknown()) }),
});

export const openapiEndpoints = [readApiDescription];
