import { HttpClient } from '@angular/common/http';
import { computed, inject, Injectable, signal } from '@angular/core';
import { catchError, firstValueFrom, of, tap, throwError } from 'rxjs';
import type { Observable } from 'rxjs';
import { apiUrl } from '../api/api-url';
import { Problem } from '../problems/problem';

export type RoleName =
  | 'regional-facility-manager'
  | 'technician'
  | 'store-manager'
  | 'shift-lead'
  | 'account-owner'
  | 'trainer'
  | 'administrator';

/** A role of the signed-in person and where it holds. */
export interface HeldRole {
  readonly role: RoleName;
  readonly scopeKind: 'organisation' | 'chain' | 'region' | 'store';
  readonly scopeId: string;
  readonly scopeName: string;
}

/** Who is signed in, as the server answers it. */
export interface SessionInfo {
  readonly person: {
    readonly id: string;
    readonly name: string;
    readonly email: string;
    readonly locale: string;
    /** IANA name. */
    readonly timeZone: string;
  };
  readonly organisation: { readonly id: string; readonly name: string; readonly timeZone: string };
  readonly roles: readonly HeldRole[];
  readonly abilities: readonly string[];
}

/**
 * Who is signed in and what they may do. The abilities only decide what is offered; the server
 * decides what is done.
 */
@Injectable({ providedIn: 'root' })
export class Session {
  private readonly http = inject(HttpClient);
  /** Undefined until the server was asked. */
  private readonly info = signal<SessionInfo | null | undefined>(undefined);
  private asking: Promise<SessionInfo | null> | undefined;

  readonly current = computed(() => this.info() ?? null);
  readonly person = computed(() => this.current()?.person ?? null);
  readonly roles = computed(() => this.current()?.roles ?? []);
  private readonly abilities = computed(() => new Set(this.current()?.abilities ?? []));

  /** The zone in which this person reads times. */
  readonly timeZone = computed(
    () => this.person()?.timeZone ?? Intl.DateTimeFormat().resolvedOptions().timeZone,
  );

  /** Whether the person may do this, to the server's last knowledge. */
  can(ability: string): boolean {
    return this.abilities().has(ability);
  }

  /** Asks the server once; later calls answer from what it said. */
  load(): Promise<SessionInfo | null> {
    const known = this.info();
    if (known !== undefined) return Promise.resolve(known);
    this.asking ??= firstValueFrom(
      this.http.get<SessionInfo>(apiUrl('/session')).pipe(
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
    return this.http
      .post<SessionInfo>(apiUrl('/session'), { email, password })
      .pipe(tap((info) => this.info.set(info)));
  }

  signOut(): Observable<unknown> {
    return this.http.delete(apiUrl('/session')).pipe(tap(() => this.forget()));
  }

  /** The server no longer knows us. */
  forget(): void {
    this.info.set(null);
  }
}
