import { inject, Injectable, signal } from '@angular/core';
import { Title } from '@angular/platform-browser';
import type { RouterStateSnapshot } from '@angular/router';
import { TitleStrategy } from '@angular/router';

/** Sets the window's title from the route's, and tells the announcer the page has changed. */
@Injectable({ providedIn: 'root' })
export class PageTitle extends TitleStrategy {
  private readonly title = inject(Title);
  private readonly announced = signal('');

  /** The title of the page now shown, for a live region. */
  readonly current = this.announced.asReadonly();

  override updateTitle(state: RouterStateSnapshot): void {
    const title = this.buildTitle(state);
    if (title) this.set(title);
  }

  /** For a page whose title comes with its data (a store's name). */
  set(title: string): void {
    this.announced.set(title);
    this.title.setTitle(`${title} · Vatwright`);
  }
}
