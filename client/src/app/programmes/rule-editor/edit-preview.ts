import { ChangeDetectionStrategy, Component, inject } from '@angular/core';
import { MatButton } from '@angular/material/button';
import {
  MAT_DIALOG_DATA,
  MatDialogActions,
  MatDialogClose,
  MatDialogContent,
  MatDialogTitle,
} from '@angular/material/dialog';
import type { RuleDefinition } from '@shared/programmes/rule-definition';
import type { RuleEffect } from '../programmes-api';
import { RuleChanges } from '../rule-changes/rule-changes';

export interface EditToJudge {
  readonly from: RuleDefinition;
  readonly to: RuleDefinition;
  readonly effect: RuleEffect;
  /** Number that the revision would get. */
  readonly revision: number;
  /** Titles of procedures by id. */
  readonly procedures: ReadonlyMap<string, string>;
}

/** Before an edit of a rule is saved: what it says differently, and what becomes of its tasks. */
@Component({
  selector: 'vw-edit-preview',
  imports: [
    MatButton,
    MatDialogActions,
    MatDialogClose,
    MatDialogContent,
    MatDialogTitle,
    RuleChanges,
  ],
  template: `
    <h2 mat-dialog-title i18n="@@programmes.effect">What this changes</h2>
    <mat-dialog-content>
      <div class="content">
        <vw-rule-changes [from]="edit.from" [to]="edit.to" [procedures]="edit.procedures" />
        <h3 i18n="@@programmes.effect-tasks">Its tasks</h3>
        <table>
          @for (line of lines; track line.key) {
            <tr [class.none]="line.count === 0" [attr.data-effect]="line.key">
              <td class="vw-figure">{{ line.count }}</td>
              <th scope="row">{{ line.words }}</th>
            </tr>
          }
        </table>
        <p class="vw-small vw-secondary" i18n="@@programmes.effect-when">
          The worker brings the tasks in line within minutes of saving.
        </p>
      </div>
    </mat-dialog-content>
    <mat-dialog-actions align="end">
      <button matButton type="button" mat-dialog-close i18n="@@programmes.write-on">
        Go on writing
      </button>
      <button matButton="filled" type="button" [mat-dialog-close]="true">
        <ng-container i18n="@@programmes.save-as"
          >Save as revision {{ edit.revision }}</ng-container
        >
      </button>
    </mat-dialog-actions>
  `,
  styles: `
    .content {
      display: grid;
      gap: var(--vw-space-4);
      color: var(--vw-ink);
    }
    table {
      border-collapse: collapse;
    }
    td,
    th {
      padding: var(--vw-space-1) var(--vw-space-3) var(--vw-space-1) 0;
      font-weight: 400;
      text-align: start;
      vertical-align: baseline;
    }
    td {
      width: 1%;
      min-width: 3ch;
      font-size: 1.0625rem;
      font-weight: 600;
      text-align: end;
    }
    .none {
      color: var(--vw-ink-2);
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class EditPreview {
  protected readonly edit = inject<EditToJudge>(MAT_DIALOG_DATA);

  protected readonly lines = [
    { key: 'added', words: $localize`:@@programmes.effect.added:written anew` },
    {
      key: 'moved',
      words: $localize`:@@programmes.effect.moved:moved: the same due time, with another window, place, procedure or pair of hands`,
    },
    { key: 'withdrawn', words: $localize`:@@programmes.effect.withdrawn:withdrawn` },
    {
      key: 'unchanged',
      words: $localize`:@@programmes.effect.unchanged:to come, the same as before`,
    },
    {
      key: 'leftAlone',
      words: $localize`:@@programmes.effect.left-alone:open, deferred or promised on a route: left alone`,
    },
  ].map((line) => ({ ...line, count: this.edit.effect[line.key as keyof RuleEffect] }));
}
