import { computed, inject, Injectable, signal } from '@angular/core';
import type { Ability } from '@shared/access/ability';
import type { ReplyOf } from '@shared/contract/endpoint';
import type { readSession, signIn, signOut } from '@shared/sign-in/sign-in-contract';
import { catchError, firstValueFrom, of, tap, throwError } from 'rxjs';
import type { Observable } from 'rxjs';
import { Api } from '../api/api';
import { forgetDevice } from '../offline/forget-device';
import { Problem } from '../problems/problem';

/** Who is signed in, as the server answers it. */
export type SessionInfo = ReplyOf<typeof readSession>;

/**
 * Who is signed in and what they may do. The abilities only decide what is offered; the server
 * decides what is done.
 */
@Injectable({ providedIn: 'root' })
export class Session {
  private readonly api = inject(Api);
  /** Undefined until the server was asked. */
  private readonly info = signal<SessionInfo | null | undefined>(undefined);
  private asking: Promise<SessionInfo | null> | undefined;

  readonly current = computed(() => this.info() ?? null);
  readonly person = computed(() => this.current()?.person ?? null);
  readonly roles = computed(() => this.current()?.roles ?? []);
  private readonly abilities = computed(() => new Set<Ability>(this.current()?.abilities ?? []));

  /** The zone in which this person reads times. */
  readonly timeZone = computed(
    () => this.person()?.timeZone ?? Intl.DateTimeFormat().resolvedOptions().timeZone,
  );

  /** Whether the person may do this, to the server's last knowledge. */
  can(ability: Ability): boolean {
    return this.abilities().has(ability);
  }

  /** Asks the server once; later calls answer from what it said. */
  load(): Promise<SessionInfo | null> {
    const known = this.info();
    if (known !== undefined) return Promise.resolve(known);
    this.asking ??= firstValueFrom(
      this.api.call<typeof readSession>('GET', '/session').pipe(
        catchError((failure: unknown) =>
          failure instanceof Problem && failure.status === 401
            ? of(null)
            : throwError(() => failure),
        ),
        tap((info) => this.info.set(info)),
      ),
    ).finally(() => (this.asking = undefined));
    return this.asking;
  }

  /** Asks again, after the person changed something about themselves. */
  refresh(): Promise<SessionInfo | null> {
    this.info.set(undefined);
    return this.load();
  }

  signIn(email: string, password: string): Observable<SessionInfo> {
    return this.api
      .call<typeof signIn>('POST', '/session', { body: { email, password } })
      .pipe(tap((info) => this.info.set(info)));
  }

  signOut(): Observable<unknown> {
    return this.api.call<typeof signOut>('DELETE', '/session').pipe(
      tap(() => {
        this.forget();
        forgetDevice();
      }),
    );
  }

  /** The server no longer knows us. */
  forget(): void {
    this.info.set(null);
  }
}
