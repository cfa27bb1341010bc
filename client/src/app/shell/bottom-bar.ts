import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { MatMenu, MatMenuItem, MatMenuTrigger } from '@angular/material/menu';
import { RouterLink, RouterLinkActive } from '@angular/router';
import { Icon } from '../ui/icon/icon';
import type { NavigationItem } from './navigation';

/** Places at the thumb; with more entries the last place holds the rest. */
const PLACES = 5;

/** The navigation of a phone, at the foot of the screen. */
@Component({
  selector: 'vw-bottom-bar',
  imports: [Icon, MatMenu, MatMenuItem, MatMenuTrigger, RouterLink, RouterLinkActive],
  templateUrl: './bottom-bar.html',
  styleUrl: './bottom-bar.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class BottomBar {
  readonly items = input.required<readonly NavigationItem[]>();

  private readonly fits = computed(() => this.items().length <= PLACES);
  protected readonly shown = computed(() =>
    this.fits() ? this.items() : this.items().slice(0, PLACES - 1),
  );
  protected readonly rest = computed(() => (this.fits() ? [] : this.items().slice(PLACES - 1)));
}
