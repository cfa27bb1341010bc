import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import type { Severity } from '@shared/findings/cause';
import { Icon } from '../../ui/icon/icon';
import type { IconName } from '../../ui/icon/icon-paths';
import { FindingWords } from '../finding-words';

const icons: Readonly<Record<Severity, IconName>> = { watch: 'eye', plan: 'tools', stop: 'stop' };

/** How urgent a finding is: a sign of its own shape and the word. */
@Component({
  selector: 'vw-severity-mark',
  imports: [Icon],
  template: '<vw-icon [name]="icon()" />{{ word() }}',
  styles: `
    :host {
      display: inline-flex;
      align-items: center;
      gap: 6px;
      color: var(--vw-steel);
      font-weight: 600;
      white-space: nowrap;
    }
    :host(.plan) {
      color: var(--vw-amber-ink);
    }
    :host(.stop) {
      color: var(--vw-vermilion);
    }
    :host(.settled) {
      color: var(--vw-ink-2);
      font-weight: 400;
    }
  `,
  host: { '[class]': 'severity()', '[class.settled]': 'settled()' },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SeverityMark {
  readonly severity = input.required<Severity>();
  /** A settled finding asks for nothing any more, so its colour is withdrawn. */
  readonly settled = input(false);

  private readonly words = inject(FindingWords);
  protected readonly icon = computed(() => icons[this.severity()]);
  protected readonly word = computed(() => this.words.severity(this.severity()));
}
