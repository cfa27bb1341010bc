import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import type { LetterState as State } from '@shared/mail/letter-kind';
import { Icon } from '../ui/icon/icon';
import type { IconName } from '../ui/icon/icon-paths';
import { letterStateWord } from './letter-words';

const signs: Readonly<Record<State, IconName>> = { queued: 'clock', sent: 'check', dead: 'stop' };

/** How far a letter has come: a sign of its own shape and its word. */
@Component({
  selector: 'vw-letter-state',
  imports: [Icon],
  template: `<span class="line" [class]="state()"><vw-icon [name]="sign()" />{{ word() }}</span>`,
  styles: `
    .line {
      display: inline-flex;
      align-items: center;
      gap: 5px;
      white-space: nowrap;
    }
    vw-icon {
      width: 18px;
      height: 18px;
    }
    .sent vw-icon {
      color: var(--vw-kelp);
    }
    .dead {
      color: var(--vw-vermilion);
      font-weight: 600;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class LetterState {
  readonly state = input.required<State>();

  protected readonly sign = computed(() => signs[this.state()]);
  protected readonly word = computed(() => letterStateWord(this.state()));
}
