import { InjectionToken } from '@angular/core';

/** The IANA zone in which the reader lives; the browser's unless the application knows better. */
export const VIEWER_ZONE = new InjectionToken<() => string>('viewer zone', {
  providedIn: 'root',
  factory: () => () => Intl.DateTimeFormat().resolvedOptions().timeZone,
});
