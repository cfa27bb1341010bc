import { DestroyRef, inject, Injectable } from '@angular/core';
import { takeUntilDestroyed } from '@angular/core/rxjs-interop';
import { NavigationEnd, NavigationStart, Router } from '@angular/router';

/** Milliseconds during which a page may still grow to where one was. */
const PATIENCE = 1200;

/**
 * Keeps the place in each page for Back and Forward where the page scrolls inside the frame (on a
 * phone, between header and bottom bar); the router itself knows only the window's place.
 */
@Injectable()
export class KeptScroll {
  private readonly router = inject(Router);
  private readonly destroyRef = inject(DestroyRef);
  private readonly places = new Map<number, number>();
  private page = 0;
  private back: number | undefined;

  /** Follows the navigation from here on; `frame` gives the element that scrolls. */
  follow(frame: () => HTMLElement): void {
    let path = pathOf(this.router.url);
    this.router.events.pipe(takeUntilDestroyed(this.destroyRef)).subscribe((event) => {
      if (event instanceof NavigationStart) {
        this.places.set(this.page, frame().scrollTop);
        const restored = event.restoredState?.navigationId;
        this.back = restored === undefined ? undefined : this.places.get(restored);
      }
      if (event instanceof NavigationEnd) {
        this.page = event.id;
        const before = path;
        path = pathOf(event.urlAfterRedirects);
        if (this.back !== undefined) scrollWhenTall(frame(), this.back);
        else if (before !== path) frame().scrollTop = 0;
      }
    });
  }
}

function pathOf(url: string): string {
  return url.split(/[?#]/)[0] ?? '';
}

/** The page may still be loading its rows: tries each frame until it is tall enough. */
function scrollWhenTall(frame: HTMLElement, top: number): void {
  const until = performance.now() + PATIENCE;
  const attempt = (): void => {
    frame.scrollTop = top;
    if (Math.abs(frame.scrollTop - top) > 1 && performance.now() < until) {
      requestAnimationFrame(attempt);
    }
  };
  attempt();
}
