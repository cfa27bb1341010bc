import type { Request, Response, Router } from 'express';
import type * as z from 'zod';
import { type Ability, grantsWith } from '@shared/access/ability';
import type { BodyOf, Endpoint, ParamsOf, QueryOf, ReplyOf } from '@shared/contract/endpoint';
import { Problem, forbidden } from '@shared/problem';
import { type Tenant, inTenant } from '@db/tenant-transaction';
import type { Actor } from '../access/actor';
import { loadActor } from '../access/load-actor';
import { once } from './idempotency';
import type { Services } from './services';
import { readInput } from './validate';

export interface Input<E> {
  readonly params: ParamsOf<E>;
  readonly query: QueryOf<E>;
  readonly body: BodyOf<E>;
}

/** What a handler of a signed-in person's call is given. */
export interface Call<E> extends Input<E>, Services {
  readonly actor: Actor;
  readonly tenant: Tenant;
  readonly req: Request;
}

/** What a handler of a public call is given: nobody is signed in, no organisation is known. */
export interface PublicCall<E> extends Input<E>, Services {
  readonly req: Request;
  readonly res: Response;
}

type AnyEndpoint = Endpoint;

const signedOut = () => new Problem(401, 'signed-out', 'Please sign in.');

/**
 * Binds endpoints to handlers. A signed-in call is authenticated, validated and run in one
 * transaction of the actor's organisation, and a write that carries an idempotency key runs once.
 */
export class Routes {
  /** What was bound, in order: the API describes itself from this, and tests walk it. */
  readonly endpoints: AnyEndpoint[] = [];

  constructor(
    private readonly router: Router,
    readonly services: Services,
  ) {}

  on<E extends AnyEndpoint>(
    endpoint: E,
    handler: (call: Call<E>) => Promise<ReplyOf<E> | void>,
  ): void {
    this.bind(endpoint, async (req, res) => {
      const reply = await this.asActor(endpoint, req, (call) =>
        once(call, () => handler(call as Call<E>)),
      );
      this.send(endpoint, res, reply);
    });
  }

  /**
   * For a body that is no JSON: it is received before the transaction begins, so that a slow sender
   * holds no connection to the database.
   */
  upload<E extends AnyEndpoint, R>(
    endpoint: E,
    receive: (req: Request) => Promise<R>,
    handler: (call: Call<E> & { readonly received: R }) => Promise<ReplyOf<E> | void>,
  ): void {
    this.bind(endpoint, async (req, res) => {
      // Whoever may not send one is told so before the first byte is read.
      await this.asActor(endpoint, req, async () => undefined);
      const received = await receive(req);
      const reply = await this.asActor(endpoint, req, (call) =>
        handler({ ...(call as Call<E>), received }),
      );
      this.send(endpoint, res, reply);
    });
  }

  /** For files and streams: the handler reads in its transaction and gives back how to send it. */
  download<E extends AnyEndpoint>(
    endpoint: E,
    handler: (call: Call<E>) => Promise<(res: Response) => Promise<void> | void>,
  ): void {
    this.bind(endpoint, async (req, res) => {
      const send = await this.asActor(endpoint, req, (call) => handler(call as Call<E>));
      await send(res);
    });
  }

  open<E extends AnyEndpoint>(
    endpoint: E,
    handler: (call: PublicCall<E>) => Promise<ReplyOf<E> | void>,
  ): void {
    this.bind(endpoint, async (req, res) => {
      const input = readInput(endpoint, req) as Input<E>;
      this.send(endpoint, res, await handler({ ...input, ...this.services, req, res }));
    });
  }

  private bind(endpoint: AnyEndpoint, answer: (req: Request, res: Response) => Promise<void>) {
    const method = endpoint.method.toLowerCase() as 'get' | 'post' | 'put' | 'patch' | 'delete';
    this.router[method](endpoint.path, answer);
    this.endpoints.push(endpoint);
  }

  private asActor<T>(
    endpoint: AnyEndpoint,
    req: Request,
    work: (call: Call<AnyEndpoint>) => Promise<T>,
  ): Promise<T> {
    if (!req.user) throw signedOut();
    const { personId, organisationId } = req.user;
    return inTenant(this.services.sequelize, organisationId, async (tenant) => {
      const actor = await loadActor(tenant, personId);
      if (
        endpoint.access !== 'signed-in' &&
        grantsWith(endpoint.access as Ability, actor.grants).length === 0
      ) {
        throw forbidden();
      }
      const input = readInput(endpoint, req) as Input<AnyEndpoint>;
      return work({ ...input, ...this.services, actor, tenant, req });
    });
  }

  private send(endpoint: AnyEndpoint, res: Response, reply: unknown): void {
    if (reply === undefined) {
      res.status(204).end();
      return;
    }
    // Under test every real reply is held against the contract; in production that would cost time.
    if (this.services.config.NODE_ENV === 'test') checkReply(endpoint.reply, reply);
    res.json(reply);
  }
}

function checkReply(schema: z.ZodType, reply: unknown): void {
  schema.parse(JSON.parse(JSON.stringify(reply)));
}
