import { ChangeDetectionStrategy, Component } from '@angular/core';

/** The vat, filled, with its tick: the product's mark, and its name. */
@Component({
  selector: 'vw-brand',
  template: `
    <svg viewBox="0 0 20 20" aria-hidden="true" focusable="false">
      <path class="body" d="M3 4.5 4.6 13 10 17 15.4 13 17 4.5z" />
      <path class="rim" d="M1.5 4.5H4M16 4.5h2.5" />
      <path class="tick" d="M6.9 9.4l2.3 2.3 4-4.2" />
    </svg>
    <span>Vatwright</span>
  `,
  styles: `
    :host {
      display: inline-flex;
      align-items: center;
      gap: 8px;
      color: var(--vw-ink);
      font-size: 1.25rem;
      font-weight: 700;
      line-height: 1;
    }
    svg {
      width: 1.3em;
      height: 1.3em;
      fill: none;
      stroke: var(--vw-brand-ink, var(--vw-kelp));
      stroke-width: 1.6;
      stroke-linecap: round;
      stroke-linejoin: round;
    }
    .body {
      fill: var(--vw-brand-ink, var(--vw-kelp));
    }
    .tick {
      stroke: var(--vw-brand-paper, var(--vw-card));
      stroke-width: 1.9;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class Brand {}
