import type { HttpResourceRef } from '@angular/common/http';
import { HttpClient, httpResource } from '@angular/common/http';
import { inject, Injectable } from '@angular/core';
import type { Observable } from 'rxjs';
import { apiUrl } from '../api/api-url';

/** One place where the person is signed in. */
export interface OwnSession {
  readonly id: string;
  readonly current: boolean;
  /** Browser and system in words, as far as they are known. */
  readonly device: string;
  readonly createdAt: string;
  readonly lastSeenAt: string;
}

export interface OwnDetails {
  readonly name: string;
  readonly locale: string;
  readonly timeZone: string;
}

/** What a person may change about themselves. */
@Injectable({ providedIn: 'root' })
export class AccountApi {
  private readonly http = inject(HttpClient);

  sessions(): HttpResourceRef<{ readonly sessions: readonly OwnSession[] } | undefined> {
    return httpResource<{ readonly sessions: readonly OwnSession[] }>(() => apiUrl('/sessions'));
  }

  endSession(id: string): Observable<unknown> {
    return this.http.delete(apiUrl('/sessions/:id', { id }));
  }

  /** Every session, this one too. */
  endAllSessions(): Observable<unknown> {
    return this.http.delete(apiUrl('/sessions'));
  }

  saveDetails(details: OwnDetails): Observable<unknown> {
    return this.http.patch(apiUrl('/session/person'), details);
  }

  changePassword(currentPassword: string, newPassword: string): Observable<unknown> {
    return this.http.put(apiUrl('/session/password'), { currentPassword, newPassword });
  }
}
