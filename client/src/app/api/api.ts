import type { HttpResourceRef } from '@angular/common/http';
import { HttpClient, httpResource } from '@angular/common/http';
import { inject, Injectable } from '@angular/core';
import type { ParamsOf, QueryOf, ReplyOf } from '@shared/contract/endpoint';
import type { Observable } from 'rxjs';
import type * as z from 'zod';
import { apiQuery, apiUrl } from './api-url';

/** What an endpoint takes as body, before the server fills its defaults. */
export type SentBody<E> = E extends { readonly body?: infer S }
  ? NonNullable<S> extends z.ZodType
    ? z.input<NonNullable<S>>
    : never
  : never;

/** What may go with a call. Defaults of the query are the server's, so every name is optional. */
export interface Sent<E> {
  readonly params?: ParamsOf<E>;
  readonly query?: Partial<QueryOf<E>>;
  readonly body?: SentBody<E> | FormData;
  /** Makes repeats of the same act one act; without it each call gets a new key. */
  readonly idempotencyKey?: string;
}

interface AnyEndpoint {
  readonly method: string;
  readonly path: string;
}

/** Reads want parameters and query only. */
export type Asked<E> = Pick<Sent<E>, 'params' | 'query'>;

/**
 * The one way to the server. Types come from the contract by `import type`, so no schema reaches
 * the bundle:
 *
 * @example
 * import type { listStores } from '@shared/fleet/fleet-contract';
 * api.call<typeof listStores>('GET', '/stores', { query: { search: 'mill' } });
 * api.resource<typeof listStores>('/stores', () => ({ query: filters() }));
 *
 * Failures arrive as {@link Problem}.
 */
@Injectable({ providedIn: 'root' })
export class Api {
  private readonly http = inject(HttpClient);

  /** One request, made when subscribed to. */
  call<E extends AnyEndpoint>(
    method: E['method'],
    path: E['path'],
    sent: Sent<E> = {},
  ): Observable<ReplyOf<E>> {
    return this.http.request<ReplyOf<E>>(method, apiUrl(path, asRecord(sent.params)), {
      params: apiQuery(asRecord(sent.query)),
      body: sent.body,
      ...(sent.idempotencyKey ? { headers: { 'Idempotency-Key': sent.idempotencyKey } } : {}),
    });
  }

  /**
   * A read that follows its signals: asked again when they change, not asked while `ask` answers
   * undefined. Call it where injection is possible (a field of a class).
   */
  resource<E extends AnyEndpoint>(
    path: E['path'],
    ask: () => Asked<E> | undefined,
  ): HttpResourceRef<ReplyOf<E> | undefined> {
    return httpResource<ReplyOf<E>>(() => {
      const asked = ask();
      return asked
        ? { url: apiUrl(path, asRecord(asked.params)), params: apiQuery(asRecord(asked.query)) }
        : undefined;
    });
  }

  /** The address of a read, for a link that downloads (exports, photos). */
  address<E extends AnyEndpoint>(path: E['path'], asked: Asked<E> = {}): string {
    const query = apiQuery(asRecord(asked.query)).toString();
    return apiUrl(path, asRecord(asked.params)) + (query ? `?${query}` : '');
  }
}

function asRecord(value: unknown): Readonly<Record<string, unknown>> {
  return (value ?? {}) as Readonly<Record<string, unknown>>;
}
