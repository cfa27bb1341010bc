import { ChangeDetectionStrategy, Component, computed, input, output } from '@angular/core';
import type { TaskState } from '@shared/tasks/task-state';
import { StateWord } from '../../ui/state-word/state-word';
import { taskStates } from '../../ui/text/state-word';

/** Every state with its sign: a legend whose entries choose what is listed. */
@Component({
  selector: 'vw-state-filter',
  imports: [StateWord],
  template: `
    <div class="states" role="group" i18n-aria-label="@@tasks.states" aria-label="States shown">
      @for (state of states; track state) {
        <button
          type="button"
          [class.on]="chosen().has(state)"
          [attr.aria-pressed]="chosen().has(state)"
          (click)="toggle(state)"
        >
          <vw-state-word [state]="state" />
        </button>
      }
      <button
        type="button"
        class="all"
        [class.on]="chosen().size === 0"
        [attr.aria-pressed]="chosen().size === 0"
        (click)="changed.emit([])"
        i18n="@@tasks.states.all"
      >
        all
      </button>
    </div>
  `,
  styles: `
    .states {
      display: flex;
      flex-wrap: wrap;
      gap: 6px;
    }
    button {
      min-height: 34px;
      padding: 0 11px 0 8px;
      border: 1px solid transparent;
      border-radius: 17px;
      background: none;
      color: var(--vw-ink-2);
      font: inherit;
      font-size: var(--vw-text-small);
      cursor: pointer;
    }
    .all {
      padding-inline: 12px;
    }
    button:hover {
      background: var(--vw-hover);
    }
    .on,
    .on:hover {
      border-color: var(--vw-edge);
      background: var(--vw-card);
      color: var(--vw-ink);
      font-weight: 600;
    }
    @media (pointer: coarse) {
      button {
        min-height: 44px;
        border-radius: 22px;
      }
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class StateFilter {
  /** Empty for all. */
  readonly chosen = input.required<ReadonlySet<TaskState>>();

  readonly changed = output<readonly TaskState[]>();

  protected readonly states = taskStates;
  private readonly ordered = computed(() => taskStates.filter((it) => this.chosen().has(it)));

  protected toggle(state: TaskState): void {
    const chosen = this.ordered();
    this.changed.emit(
      chosen.includes(state)
        ? chosen.filter((it) => it !== state)
        : taskStates.filter((it) => it === state || chosen.includes(it)),
    );
  }
}
