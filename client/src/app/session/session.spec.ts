import { provideHttpClient, withInterceptors } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import { TestBed } from '@angular/core/testing';
import { Router } from '@angular/router';
import { problemInterceptor } from '../problems/problem-interceptor';
import type { SessionInfo } from './session';
import { Session } from './session';
import { sessionInterceptor } from './session-interceptor';

const info: SessionInfo = {
  person: {
    id: '6f3b8a34-0000-4000-8000-000000000001',
    name: 'Maya Lindgren',
    email: 'maya@example.com',
    locale: 'en',
    timeZone: 'America/Denver',
  },
  organisation: { id: 'o-1', name: 'Northlake Kitchen Care', timeZone: 'America/Chicago' },
  roles: [{ role: 'technician', scopeKind: 'region', scopeId: 'r-1', scopeName: 'North Lakes' }],
  abilities: ['today.read'],
};

describe('Session', () => {
  let session: Session;
  let http: HttpTestingController;
  const navigate = jest.fn().mockResolvedValue(true);

  beforeEach(() => {
    navigate.mockClear();
    TestBed.configureTestingModule({
      providers: [
        provideHttpClient(withInterceptors([sessionInterceptor, problemInterceptor])),
        provideHttpClientTesting(),
        { provide: Router, useValue: { navigate, url: '/tasks?state=overdue' } },
      ],
    });
    session = TestBed.inject(Session);
    http = TestBed.inject(HttpTestingController);
  });
  afterEach(() => http.verify());

  it('asks the server once for all who want to know', async () => {
    const both = Promise.all([session.load(), session.load()]);
    http.expectOne('/api/v1/session').flush(info);
    expect(await both).toEqual([info, info]);
    expect(await session.load()).toEqual(info);
    expect(session.can('today.read')).toBe(true);
    expect(session.can('people.read')).toBe(false);
    expect(session.timeZone()).toBe('America/Denver');
  });

  it('takes 401 for nobody signed in, without leading anywhere', async () => {
    const loaded = session.load();
    http.expectOne('/api/v1/session').flush(null, { status: 401, statusText: 'Unauthorized' });
    expect(await loaded).toBeNull();
    expect(navigate).not.toHaveBeenCalled();
  });

  it('does not take a broken server for nobody signed in, and asks again', async () => {
    const failed = session.load();
    http.expectOne('/api/v1/session').flush(null, { status: 503, statusText: 'Unavailable' });
    await expect(failed).rejects.toMatchObject({ status: 503 });
    const again = session.load();
    http.expectOne('/api/v1/session').flush(info);
    expect(await again).toEqual(info);
  });

  it('gives each write a key of its own and a read none', () => {
    session.signIn('maya@example.com', 'six unrelated words').subscribe();
    const first = http.expectOne({ method: 'POST', url: '/api/v1/session' });
    first.flush(info);
    session.signOut().subscribe();
    const second = http.expectOne({ method: 'DELETE', url: '/api/v1/session' });
    second.flush(null);
    const keys = [first, second].map((sent) => sent.request.headers.get('Idempotency-Key'));
    expect(keys[0]).toMatch(/^[0-9a-f-]{36}$/);
    expect(keys[1]).not.toBe(keys[0]);
    void session.refresh();
    const read = http.expectOne({ method: 'GET', url: '/api/v1/session' });
    expect(read.request.headers.has('Idempotency-Key')).toBe(false);
    read.flush(info);
  });

  it('leads to the sign-in page when the server forgets a session, with the way back', () => {
    session.signIn('maya@example.com', 'six unrelated words').subscribe();
    http.expectOne('/api/v1/session').flush(info);
    session.signOut().subscribe({ error: () => undefined });
    http.expectOne('/api/v1/session').flush(null, { status: 401, statusText: 'Unauthorized' });
    expect(session.current()).toBeNull();
    expect(navigate).toHaveBeenCalledWith(['/sign-in'], {
      queryParams: { returnUrl: '/tasks?state=overdue' },
    });
  });
});
