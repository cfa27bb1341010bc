import { HttpClient } from '@angular/common/http';
import { inject, Injectable } from '@angular/core';
import type { Observable } from 'rxjs';
import { apiUrl } from '../api/api-url';

/** An invitation as its link shows it. */
export interface Invitation {
  readonly email: string;
  readonly name: string;
  readonly organisationName: string;
  readonly invitedBy: string;
}

/** The server's answers to people who are not signed in yet. */
@Injectable({ providedIn: 'root' })
export class SignInApi {
  private readonly http = inject(HttpClient);

  /** Always succeeds, whether the address is known or not. */
  requestReset(email: string): Observable<unknown> {
    return this.http.post(apiUrl('/password-resets'), { email });
  }

  resetPassword(token: string, password: string): Observable<unknown> {
    return this.http.put(apiUrl('/password-resets/:token', { token }), { password });
  }

  invitation(token: string): Observable<Invitation> {
    return this.http.get<Invitation>(apiUrl('/invitations/:token', { token }));
  }

  acceptInvitation(token: string, password: string, name: string): Observable<unknown> {
    return this.http.put(apiUrl('/invitations/:token', { token }), { password, name });
  }
}
