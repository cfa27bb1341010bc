import * as z from 'zod';
import type { Endpoint } from '@shared/contract/endpoint';
import { problemSchema } from './problem-schema';

/** An OpenAPI 3.1.1 document, as far as its writers need a type for it. */
export interface ApiDescription {
  readonly openapi: '3.1.1';
  readonly info: { readonly title: string; readonly version: string; readonly description: string };
  readonly servers: readonly { readonly url: string }[];
  readonly paths: Readonly<Record<string, Readonly<Record<string, object>>>>;
  readonly components: object;
}

const COOKIE = 'session';

/**
 * Describes endpoints as an OpenAPI 3.1.1 document (its schemas are JSON Schema 2020-12, as zod writes
 * them). Everything comes from the contract: nothing here is retyped.
 */
export function describeApi(endpoints: readonly Endpoint[]): ApiDescription {
  const paths: Record<string, Record<string, object>> = {};
  for (const endpoint of endpoints) {
    const path = endpoint.path.replace(/:(\w+)/g, '{$1}');
    (paths[path] ??= {})[endpoint.method.toLowerCase()] = operation(endpoint);
  }
  return {
    openapi: '3.1.1',
    info: {
      title: 'Vatwright',
      version: '1',
      description:
        'Every write needs the X-XSRF-TOKEN header with the value of the XSRF-TOKEN cookie. ' +
        'Errors are problem documents as in RFC 9457.',
    },
    servers: [{ url: '/api/v1' }],
    paths,
    components: {
      securitySchemes: { [COOKIE]: { type: 'apiKey', in: 'cookie', name: COOKIE } },
      responses: {
        Problem: {
          description: 'What went wrong, with every field error at once',
          content: { 'application/problem+json': { schema: problemSchema } },
        },
      },
    },
  };
}

function operation({
  access,
  body,
  params,
  path,
  query,
  method,
  reply,
  summary,
}: Endpoint): object {
  const isEmpty = reply.safeParse(undefined).success;
  return {
    summary,
    operationId: operationId(method, path),
    'x-ability': access,
    security: access === 'public' ? [] : [{ [COOKIE]: [] }],
    parameters: [...parametersOf(params, 'path'), ...parametersOf(query, 'query')],
    ...(body && {
      requestBody: { required: true, content: { 'application/json': { schema: schemaOf(body) } } },
    }),
    responses: {
      ...(isEmpty
        ? { 204: { description: 'Done; nothing to say' } }
        : {
            200: {
              description: 'The answer',
              content: { 'application/json': { schema: schemaOf(reply, 'output') } },
            },
          }),
      default: { $ref: '#/components/responses/Problem' },
    },
  };
}

/** `PUT /tasks/:id/inspection` becomes `put_tasks_id_inspection`. */
const operationId = (method: string, path: string) =>
  `${method.toLowerCase()}${path.replaceAll(/[^\w]+/g, '_')}`;

function parametersOf(schema: z.ZodType | undefined, place: 'path' | 'query'): object[] {
  if (!schema) return [];
  const { properties = {}, required = [] } = schemaOf(schema);
  return Object.entries(properties).map(([name, property]) => ({
    name,
    in: place,
    required: place === 'path' || required.includes(name),
    schema: property,
  }));
}

function schemaOf(schema: z.ZodType, io: 'input' | 'output' = 'input') {
  // What JSON Schema cannot say (a transformed text, a file) stands as "anything".
  const { $schema: _dialect, ...described } = z.toJSONSchema(schema, {
    io,
    unrepresentable: 'any',
  });
  return described;
}
