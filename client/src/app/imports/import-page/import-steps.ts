import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { Icon } from '../../ui/icon/icon';
import type { Import } from '../imports-api';

/** The way of an import, and where on it one stands. */
@Component({
  selector: 'vw-import-steps',
  imports: [Icon],
  template: `
    <ol>
      @for (step of steps; track step; let index = $index) {
        <li [attr.aria-current]="index === now() ? 'step' : null" [class.past]="index < now()">
          <span class="dot" aria-hidden="true">
            @if (index < now()) {
              <vw-icon name="check" />
            } @else {
              {{ index + 1 }}
            }
          </span>
          <span class="word">{{ step }}</span>
          @if (index < now()) {
            <span class="vw-hidden" i18n="@@imports.step.done">(done)</span>
          }
        </li>
      }
    </ol>
  `,
  styles: `
    ol {
      display: flex;
      flex-wrap: wrap;
      gap: var(--vw-space-2) var(--vw-space-5);
      margin: var(--vw-space-3) 0 var(--vw-space-4);
      padding: 0;
      list-style: none;
    }
    li {
      display: inline-flex;
      gap: var(--vw-space-2);
      align-items: center;
      color: var(--vw-ink-2);
    }
    li[aria-current] {
      color: var(--vw-ink);
      font-weight: 600;
    }
    .dot {
      display: grid;
      place-items: center;
      width: 26px;
      height: 26px;
      border: 1.6px solid var(--vw-edge);
      border-radius: 50%;
      font-size: var(--vw-text-tiny);
      font-weight: 600;
    }
    [aria-current] .dot {
      border-color: var(--vw-kelp);
      background: var(--vw-kelp);
      color: var(--vw-on-kelp);
    }
    .past .dot {
      border-color: var(--vw-kelp);
      color: var(--vw-kelp);
    }
    .dot vw-icon {
      width: 14px;
      height: 14px;
    }
    @media (width < 480px) {
      li:not([aria-current]) .word {
        position: absolute;
        width: 1px;
        height: 1px;
        overflow: hidden;
        clip-path: inset(50%);
        white-space: nowrap;
      }
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ImportSteps {
  /** State of the import; null before there is one. */
  readonly state = input.required<Import['state'] | null>();

  protected readonly steps = [
    $localize`:@@imports.step.file:File`,
    $localize`:@@imports.step.columns:Columns`,
    $localize`:@@imports.step.check:Look it over`,
    $localize`:@@imports.step.result:Result`,
  ];
  protected readonly now = computed(() => {
    switch (this.state()) {
      case null:
        return 0;
      case 'mapping':
        return 1;
      case 'checking':
      case 'checked':
        return 2;
      default:
        return 3;
    }
  });
}
