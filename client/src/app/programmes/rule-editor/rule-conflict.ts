import { ChangeDetectionStrategy, Component, input, output } from '@angular/core';
import { MatButton } from '@angular/material/button';
import type { RuleDefinition } from '@shared/programmes/rule-definition';
import type { Rule } from '../programmes-api';
import { RuleChanges } from '../rule-changes/rule-changes';

/** What somebody else saved, and what stands in the form. */
export interface Conflict {
  readonly theirs: Rule;
  readonly mine: RuleDefinition;
}

/** Both sides of a rule that two people changed at once, and the choice between them. */
@Component({
  selector: 'vw-rule-conflict',
  imports: [MatButton, RuleChanges],
  template: `
    <h2 i18n="@@programmes.conflict">Somebody else changed this rule meanwhile</h2>
    <p i18n="@@programmes.conflict-text">From their revision to yours this differs:</p>
    <vw-rule-changes [from]="theirs()" [to]="mine()" [procedures]="procedures()" />
    <div class="vw-row">
      <button matButton="outlined" type="button" (click)="taken.emit()">
        <ng-container i18n="@@programmes.take-theirs">Go on with theirs</ng-container>
      </button>
      <button matButton="filled" type="button" (click)="kept.emit()">
        <ng-container i18n="@@programmes.keep-mine">Save mine over it</ng-container>
      </button>
    </div>
  `,
  styles: `
    :host {
      display: grid;
      gap: var(--vw-space-3);
      padding: var(--vw-space-4);
    }
  `,
  host: { class: 'vw-sheet' },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class RuleConflict {
  readonly theirs = input.required<Rule>();
  readonly mine = input.required<RuleDefinition>();
  readonly procedures = input.required<ReadonlyMap<string, string>>();

  readonly taken = output();
  readonly kept = output();
}
