import { DOCUMENT, inject, Injectable, LOCALE_ID } from '@angular/core';
import { Router } from '@angular/router';

export type Language = 'en' | 'es';

const ONE_YEAR = 31_536_000;

/** The language of the screens. Each is a build of its own, so a change loads the page anew. */
@Injectable({ providedIn: 'root' })
export class LanguageChoice {
  private readonly document = inject(DOCUMENT);
  private readonly router = inject(Router);

  readonly current: Language = inject(LOCALE_ID).startsWith('es') ? 'es' : 'en';

  /** The languages by their own names, which are never translated. */
  readonly all: readonly { readonly code: Language; readonly name: string }[] = [
    { code: 'en', name: 'English' },
    { code: 'es', name: 'Español' },
  ];

  /** Remembers the language on this device and opens the same page in it. */
  choose(language: Language): void {
    if (language === this.current) return;
    this.remember(language);
    this.document.location.assign(`/${language}${this.router.url}`);
  }

  /** The server reads this cookie where an address names no language. */
  private remember(language: Language): void {
    const secure = this.document.location.protocol === 'https:' ? '; Secure' : '';
    this.document.cookie = `lang=${language}; Path=/; Max-Age=${ONE_YEAR}; SameSite=Lax${secure}`;
  }
}
