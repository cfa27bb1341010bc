import { DecimalPipe } from '@angular/common';
import {
  ChangeDetectionStrategy,
  Component,
  computed,
  inject,
  input,
  LOCALE_ID,
} from '@angular/core';
import { Icon } from '../../ui/icon/icon';
import { zonedText } from '../../ui/text/zoned-text';
import type { Store } from '../fleet-api';

/** Where a store is, how to get in, and what its clock says. */
@Component({
  selector: 'vw-store-where',
  imports: [DecimalPipe, Icon],
  template: `
    <section class="vw-sheet panel">
      <h2 i18n="@@fleet.where">Where</h2>
      <dl>
        <dt i18n="@@fleet.address">Address</dt>
        <dd>
          @for (line of address(); track $index) {
            <span class="line">{{ line }}</span>
          } @empty {
            <span class="vw-secondary" i18n="@@fleet.not-given">not given</span>
          }
        </dd>
        <dt i18n="@@fleet.phone">Phone</dt>
        <dd>
          @if (store().phone) {
            <a [href]="'tel:' + dialled()">{{ store().phone }}</a>
          } @else {
            <span class="vw-secondary" i18n="@@fleet.not-given">not given</span>
          }
        </dd>
        <dt i18n="@@fleet.access-note">Getting in</dt>
        <dd class="note">
          @if (store().accessNote) {
            {{ store().accessNote }}
          } @else {
            <span class="vw-secondary" i18n="@@fleet.not-given">not given</span>
          }
        </dd>
        <dt i18n="@@fleet.position">Position</dt>
        <dd>
          <a [href]="geo()"
            ><vw-icon name="pin" /> {{ store().latitude | number: '1.4-5' }},
            {{ store().longitude | number: '1.4-5' }}</a
          >
          <span class="line vw-small vw-secondary">
            @if (store().positionFrom === 'coordinates') {
              <ng-container i18n="@@fleet.position-given"
                >as given, degrees north and east</ng-container
              >
            } @else {
              <ng-container i18n="@@fleet.position-zip">middle of the ZIP code area</ng-container>
            }
          </span>
        </dd>
        <dt i18n="@@fleet.time-zone">Time zone</dt>
        <dd>
          {{ store().timeZone }}
          <span class="line vw-small vw-secondary" i18n="@@fleet.clock-now"
            >{{ now() }} there when this page was loaded</span
          >
          @if (store().timeZone !== store().timeZoneOfPosition) {
            <span class="line vw-small odd" i18n="@@fleet.zone-differs"
              >Its position would give {{ store().timeZoneOfPosition }}</span
            >
          }
        </dd>
      </dl>
    </section>
  `,
  styleUrl: '../fleet-page.scss',
  styles: `
    dl {
      display: grid;
      grid-template-columns: minmax(5rem, auto) 1fr;
      gap: var(--vw-space-3) var(--vw-space-4);
    }
    dt {
      color: var(--vw-ink-2);
    }
    dd {
      min-width: 0;
      overflow-wrap: anywhere;
    }
    .line {
      display: block;
    }
    .note {
      white-space: pre-line;
    }
    .odd {
      color: var(--vw-amber-ink);
    }
    a {
      display: inline-block;
      min-height: 24px;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class StoreWhere {
  private readonly locale = inject(LOCALE_ID);

  readonly store = input.required<Store>();

  protected readonly address = computed(() => {
    const { addressLine, city, usState, postalCode } = this.store();
    const town = [city, [usState, postalCode].filter(Boolean).join(' ')].filter(Boolean);
    return [addressLine, town.join(', ')].filter(Boolean);
  });
  protected readonly dialled = computed(() => this.store().phone.replace(/[^+\d]/g, ''));
  /** RFC 5870: opens whichever map the device has. */
  protected readonly geo = computed(() => {
    const { latitude, longitude } = this.store();
    return `geo:${latitude},${longitude}`;
  });
  protected readonly now = computed(() => {
    const { timeZone } = this.store();
    return zonedText(Date.now(), timeZone, timeZone, this.locale, 'time');
  });
}
