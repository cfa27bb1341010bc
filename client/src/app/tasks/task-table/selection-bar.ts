import { ChangeDetectionStrategy, Component, input, output } from '@angular/core';
import { MatButton } from '@angular/material/button';

/** What can be done with the chosen tasks; it stays in sight while some are chosen. */
@Component({
  selector: 'vw-selection-bar',
  imports: [MatButton],
  template: `
    <div class="bar" role="region" i18n-aria-label="@@tasks.selection" aria-label="Chosen tasks">
      <p class="count" role="status">
        @if (count() === 1) {
          <ng-container i18n="@@tasks.selected-one">1 task chosen</ng-container>
        } @else {
          <ng-container i18n="@@tasks.selected">{{ count() }} tasks chosen</ng-container>
        }
      </p>
      @if (offerAll() > 0) {
        <button matButton type="button" (click)="takeAll.emit()" i18n="@@tasks.select-all-matching">
          Choose all {{ offerAll() }} that fit the filters
        </button>
      }
      <span class="acts">
        <button
          matButton="outlined"
          type="button"
          [disabled]="busy()"
          (click)="assign.emit()"
          i18n="@@tasks.assign"
        >
          Assign
        </button>
        <button
          matButton="outlined"
          type="button"
          [disabled]="busy()"
          (click)="defer.emit()"
          i18n="@@tasks.defer"
        >
          Defer
        </button>
        <button
          matButton="outlined"
          type="button"
          [disabled]="busy()"
          (click)="excuse.emit()"
          i18n="@@tasks.excuse"
        >
          Excuse
        </button>
        <button matButton type="button" (click)="clear.emit()" i18n="@@tasks.clear-selection">
          Choose none
        </button>
      </span>
    </div>
  `,
  styles: `
    .bar {
      position: fixed;
      inset: auto var(--vw-space-5) calc(env(safe-area-inset-bottom) + var(--vw-space-4));
      z-index: 20;
      display: flex;
      flex-wrap: wrap;
      align-items: center;
      gap: var(--vw-space-1) var(--vw-space-3);
      max-width: 60rem;
      margin-inline: auto;
      padding: var(--vw-space-2) var(--vw-space-4);
      border: 1px solid var(--vw-edge);
      border-radius: var(--vw-radius);
      background: var(--vw-card);
      box-shadow: var(--vw-shadow);
    }
    .count {
      font-weight: 600;
    }
    .acts {
      display: flex;
      flex-wrap: wrap;
      gap: var(--vw-space-2);
      margin-left: auto;
    }
    @media (width < 720px) {
      .bar {
        inset-inline: var(--vw-space-3);
        bottom: calc(env(safe-area-inset-bottom) + 68px);
      }
      .acts {
        margin-left: 0;
      }
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SelectionBar {
  readonly count = input.required<number>();
  /** How many fit the filters where that is more than chosen and few enough; else 0. */
  readonly offerAll = input(0);
  readonly busy = input(false);

  readonly takeAll = output();
  readonly assign = output();
  readonly defer = output();
  readonly excuse = output();
  readonly clear = output();
}
