import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import { MatMenu, MatMenuItem, MatMenuTrigger } from '@angular/material/menu';
import { RouterLink, RouterLinkActive } from '@angular/router';
import { Icon } from '../ui/icon/icon';
import type { NavigationItem } from './navigation';

/** The entries for which the header has no room. */
@Component({
  selector: 'vw-more-menu',
  imports: [Icon, MatMenu, MatMenuItem, MatMenuTrigger, RouterLink, RouterLinkActive],
  template: `
    <button type="button" class="trigger" [matMenuTriggerFor]="menu">
      <span i18n="@@shell.more">More</span><vw-icon name="chevron-down" />
    </button>
    <mat-menu #menu>
      @for (item of items(); track item.path) {
        <a
          mat-menu-item
          [routerLink]="['/', item.path]"
          routerLinkActive="here"
          ariaCurrentWhenActive="page"
        >
          <span class="line"><vw-icon [name]="item.icon" />{{ item.label }}</span>
        </a>
      }
    </mat-menu>
  `,
  styles: `
    :host {
      display: flex;
    }
    .trigger {
      display: inline-flex;
      align-items: center;
      gap: 2px;
      padding: 3px 0 3px;
      border: 0;
      background: none;
      color: var(--vw-ink-2);
      font: inherit;
      font-weight: 600;
      cursor: pointer;
    }
    .trigger:hover {
      color: var(--vw-ink);
    }
    .line {
      display: flex;
      align-items: center;
      gap: 10px;
    }
    .here {
      font-weight: 600;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class MoreMenu {
  readonly items = input.required<readonly NavigationItem[]>();
}
