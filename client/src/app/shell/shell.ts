import { BreakpointObserver } from '@angular/cdk/layout';
import type { ElementRef } from '@angular/core';
import { ChangeDetectionStrategy, Component, computed, inject, viewChild } from '@angular/core';
import { takeUntilDestroyed, toSignal } from '@angular/core/rxjs-interop';
import { NavigationEnd, Router, RouterLink, RouterLinkActive, RouterOutlet } from '@angular/router';
import { filter, map, pairwise } from 'rxjs';
import { Session } from '../session/session';
import { Brand } from '../ui/brand/brand';
import { AccountMenu } from './account-menu';
import { BottomBar } from './bottom-bar';
import { KeptScroll } from './kept-scroll';
import { MoreMenu } from './more-menu';
import { navigation } from './navigation';
import { PageTitle } from './page-title';

/** Widths at which the header has room for so many entries, widest first. */
const ROOM = [
  ['(width >= 1440px)', 9],
  ['(width >= 1180px)', 7],
  ['(width >= 960px)', 5],
  ['(width >= 720px)', 3],
] as const;

/** The frame around every page of a signed-in person. */
@Component({
  selector: 'vw-shell',
  imports: [AccountMenu, BottomBar, Brand, MoreMenu, RouterLink, RouterLinkActive, RouterOutlet],
  providers: [KeptScroll],
  templateUrl: './shell.html',
  styleUrl: './shell.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class Shell {
  private readonly session = inject(Session);
  private readonly router = inject(Router);
  protected readonly pageTitle = inject(PageTitle);
  private readonly main = viewChild.required<ElementRef<HTMLElement>>('main');

  private readonly matches = toSignal(
    inject(BreakpointObserver).observe(ROOM.map(([query]) => query)),
  );
  private readonly room = computed(() => {
    const breakpoints = this.matches()?.breakpoints ?? {};
    return ROOM.find(([query]) => breakpoints[query])?.[1] ?? 0;
  });

  protected readonly items = computed(() =>
    navigation.filter((item) => item.anyOf.some((ability) => this.session.can(ability))),
  );
  protected readonly shown = computed(() => this.items().slice(0, this.room()));
  protected readonly rest = computed(() => this.items().slice(this.room()));
  protected readonly onPhone = computed(() => this.room() === 0);

  constructor() {
    this.focusOnNewPage();
    inject(KeptScroll).follow(() => this.main().nativeElement);
  }

  protected skipToMain(event: Event): void {
    event.preventDefault();
    this.main().nativeElement.focus();
  }

  /** After a move to another page the focus starts at it; a change of filters leaves it be. */
  private focusOnNewPage(): void {
    this.router.events
      .pipe(
        filter((event) => event instanceof NavigationEnd),
        map((event) => event.urlAfterRedirects.split(/[?#]/)[0]),
        pairwise(),
        filter(([before, now]) => before !== now),
        takeUntilDestroyed(),
      )
      .subscribe(() => this.main().nativeElement.focus({ preventScroll: true }));
  }
}
