import type * as z from 'zod';

export type Method = 'GET' | 'POST' | 'PUT' | 'PATCH' | 'DELETE';

/**
 * One thing the server can be asked for. The server validates by its schemas, the client's calls
 * take their types from it, and the OpenAPI page is generated from it, so nothing is typed twice.
 */
export interface Endpoint<
  M extends Method = Method,
  P extends string = string,
  Params extends z.ZodType = z.ZodType,
  Query extends z.ZodType = z.ZodType,
  Body extends z.ZodType = z.ZodType,
  Reply extends z.ZodType = z.ZodType,
> {
  readonly method: M;
  /** Path under `/api/v1`, with `:name` for each parameter. */
  readonly path: P;
  /** One line for people reading the generated page. */
  readonly summary: string;
  /** Who may call at all; which rows they may touch is the policy's business. */
  readonly access: string;
  readonly params?: Params;
  readonly query?: Query;
  readonly body?: Body;
  readonly reply: Reply;
}

/** Declares an endpoint, keeping the literal types of its method, path and schemas. */
export function endpoint<
  const M extends Method,
  const P extends string,
  Params extends z.ZodType = z.ZodType<Record<string, never>>,
  Query extends z.ZodType = z.ZodType<Record<string, never>>,
  Body extends z.ZodType = z.ZodType<undefined>,
  Reply extends z.ZodType = z.ZodType<undefined>,
>(
  declaration: Endpoint<M, P, Params, Query, Body, Reply>,
): Endpoint<M, P, Params, Query, Body, Reply> {
  return declaration;
}

export type ParamsOf<E> = E extends { readonly params?: infer S } ? Read<S> : never;
export type QueryOf<E> = E extends { readonly query?: infer S } ? Read<S> : never;
export type BodyOf<E> = E extends { readonly body?: infer S } ? Read<S> : never;
export type ReplyOf<E> = E extends { readonly reply: infer S } ? Read<S> : never;

type Read<S> = NonNullable<S> extends z.ZodType ? z.output<NonNullable<S>> : never;
