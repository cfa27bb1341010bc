import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import { RouterLink } from '@angular/router';
import { Session } from '../../session/session';
import { Icon } from '../../ui/icon/icon';
import type { IconName } from '../../ui/icon/icon-paths';
import { Address } from '../address';

type View = 'table' | 'month' | 'board';

interface ViewLink {
  readonly view: View;
  readonly path: string;
  readonly icon: IconName;
  readonly label: string;
}

/** The same tasks as a table, a month or a board; the filters come along. */
@Component({
  selector: 'vw-view-switch',
  imports: [Icon, RouterLink],
  template: `
    <nav i18n-aria-label="@@tasks.views" aria-label="Views of the tasks">
      @for (link of links; track link.view) {
        <a
          [routerLink]="link.path"
          [queryParams]="place()"
          [class.here]="link.view === current()"
          [attr.aria-current]="link.view === current() ? 'page' : null"
          ><vw-icon [name]="link.icon" />{{ link.label }}</a
        >
      }
    </nav>
  `,
  styles: `
    nav {
      display: inline-flex;
      padding: 2px;
      border: 1px solid var(--vw-edge);
      border-radius: var(--vw-radius);
      background: var(--vw-card);
    }
    a {
      display: inline-flex;
      align-items: center;
      gap: 6px;
      min-height: 36px;
      padding: 0 var(--vw-space-3);
      border-radius: 8px;
      color: var(--vw-ink-2);
      text-decoration: none;
    }
    a:hover {
      color: var(--vw-ink);
      background: var(--vw-hover);
    }
    .here,
    .here:hover {
      color: var(--vw-kelp-deep);
      background: var(--vw-kelp-tint);
      font-weight: 600;
    }
    @media (pointer: coarse) {
      a {
        min-height: 44px;
      }
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ViewSwitch {
  private readonly address = inject(Address);

  readonly current = input.required<View>();

  protected readonly place = computed(() => this.address.place());
  protected readonly links: readonly ViewLink[] = [
    {
      view: 'table',
      path: '/tasks',
      icon: 'table',
      label: $localize`:@@tasks.view.table:Table`,
    },
    {
      view: 'month',
      path: '/tasks/month',
      icon: 'calendar',
      label: $localize`:@@tasks.view.month:Month`,
    },
    ...(inject(Session).can('board.read')
      ? [
          {
            view: 'board' as const,
            path: '/board',
            icon: 'board' as const,
            label: $localize`:@@tasks.view.board:Board`,
          },
        ]
      : []),
  ];
}
