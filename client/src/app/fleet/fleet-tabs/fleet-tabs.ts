import { ChangeDetectionStrategy, Component, inject } from '@angular/core';
import { RouterLink, RouterLinkActive } from '@angular/router';
import { Session } from '../../session/session';

/** The lists of the fleet, one beside the other. */
@Component({
  selector: 'vw-fleet-tabs',
  imports: [RouterLink, RouterLinkActive],
  template: `
    <nav i18n-aria-label="@@fleet.tabs" aria-label="Fleet">
      @for (tab of tabs; track tab.path) {
        <a [routerLink]="tab.path" routerLinkActive="active" ariaCurrentWhenActive="page">{{
          tab.label
        }}</a>
      }
    </nav>
  `,
  styles: `
    :host {
      display: block;
      margin-bottom: var(--vw-space-4);
    }
    nav {
      display: flex;
      gap: var(--vw-space-1);
      overflow-x: auto;
      border-bottom: 1px solid var(--vw-line);
      scrollbar-width: none;
    }
    a {
      display: inline-flex;
      flex: none;
      align-items: center;
      min-height: 44px;
      padding: 0 var(--vw-space-3);
      border-bottom: 3px solid transparent;
      color: var(--vw-ink-2);
      font-weight: 600;
      text-decoration: none;
    }
    a:first-child {
      margin-left: calc(-1 * var(--vw-space-3));
    }
    a:hover {
      color: var(--vw-ink);
    }
    a:focus-visible {
      outline-offset: -3px;
    }
    .active {
      border-bottom-color: var(--vw-kelp);
      color: var(--vw-ink);
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class FleetTabs {
  protected readonly tabs = [
    { path: '/fleet/stores', label: $localize`:@@fleet.stores:Stores` },
    { path: '/fleet/units', label: $localize`:@@fleet.units:Units` },
    { path: '/fleet/parts', label: $localize`:@@fleet.parts:Parts` },
    { path: '/fleet/chains', label: $localize`:@@fleet.chains:Chains` },
    { path: '/fleet/regions', label: $localize`:@@fleet.regions:Regions` },
    ...(inject(Session).can('fleet.import')
      ? [{ path: '/fleet/imports', label: $localize`:@@fleet.imports:Imports` }]
      : []),
  ];
}
