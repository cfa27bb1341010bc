import { provideHttpClient, withFetch, withInterceptors } from '@angular/common/http';
import type { ApplicationConfig } from '@angular/core';
import { ErrorHandler, inject, provideBrowserGlobalErrorListeners } from '@angular/core';
import {
  provideRouter,
  TitleStrategy,
  withComponentInputBinding,
  withInMemoryScrolling,
  withRouterConfig,
} from '@angular/router';
import { routes } from './app.routes';
import { AppErrorHandler } from './problems/app-error-handler';
import { problemInterceptor } from './problems/problem-interceptor';
import { Session } from './session/session';
import { sessionInterceptor } from './session/session-interceptor';
import { PageTitle } from './shell/page-title';
import { VIEWER_ZONE } from './ui/text/viewer-zone';

export const appConfig: ApplicationConfig = {
  providers: [
    provideBrowserGlobalErrorListeners(),
    // The session's interceptor stands outside the problem's: it sees what the answer became.
    provideHttpClient(withFetch(), withInterceptors([sessionInterceptor, problemInterceptor])),
    provideRouter(
      routes,
      withComponentInputBinding(),
      withInMemoryScrolling({ scrollPositionRestoration: 'enabled', anchorScrolling: 'enabled' }),
      withRouterConfig({ paramsInheritanceStrategy: 'always' }),
    ),
    { provide: TitleStrategy, useExisting: PageTitle },
    {
      provide: VIEWER_ZONE,
      useFactory: () => {
        const session = inject(Session);
        return () => session.timeZone();
      },
    },
    { provide: ErrorHandler, useClass: AppErrorHandler },
  ],
};
