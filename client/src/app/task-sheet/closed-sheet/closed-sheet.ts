import { ChangeDetectionStrategy, Component, computed, inject, input, output } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { RouterLink } from '@angular/router';
import { FindingWords } from '../../findings/finding-words';
import { InspectionReadings } from '../../findings/inspection-readings/inspection-readings';
import { Session } from '../../session/session';
import { Icon } from '../../ui/icon/icon';
import { PhotoStrip } from '../../uploads/photo-strip';
import type { TaskSheet } from '../task-sheet-api';

/** What became of a closed task: findings first, then every reading, the photos, the way back. */
@Component({
  selector: 'vw-closed-sheet',
  imports: [Icon, InspectionReadings, MatButton, PhotoStrip, RouterLink],
  template: `
    @if (sheet().inspection; as inspection) {
      @if (inspection.findings.length > 0) {
        <section>
          <h2 i18n="@@task-sheet.findings">Findings</h2>
          <ul>
            @for (finding of inspection.findings; track finding.id) {
              <li>
                <a
                  [routerLink]="['/findings', finding.id]"
                  [class.stop]="finding.severity === 'stop'"
                >
                  <vw-icon [name]="finding.severity === 'stop' ? 'stop' : 'finding'" />
                  <span>
                    <strong>{{ words.cause(finding.cause) }}</strong>
                    <span class="vw-small vw-secondary">
                      {{ words.severity(finding.severity) }}
                      @if (finding.componentKind) {
                        · {{ words.component(finding.componentKind) }}
                      }
                      @if (finding.settled) {
                        · <ng-container i18n="@@task-sheet.settled">settled</ng-container>
                      }
                    </span>
                  </span>
                  <vw-icon name="chevron-right" />
                </a>
              </li>
            }
          </ul>
        </section>
      }
      <section>
        <h2 i18n="@@task-sheet.entered">What was entered</h2>
        <vw-inspection-readings class="vw-sheet" [sheet]="sheet()" />
        <vw-photo-strip [photoIds]="photoIds()" [about]="words.text(sheet().procedure.title)" />
      </section>
      <div class="vw-row vw-no-print">
        @if (mayGoOn()) {
          <a matButton="filled" routerLink="/today" i18n="@@task-sheet.go-on">On with the day</a>
        }
        @if (sheet().mayUndo) {
          <button matButton="outlined" type="button" (click)="undo.emit()" i18n="@@task-sheet.undo">
            Take the closing back
          </button>
        }
      </div>
    }
  `,
  styles: `
    :host,
    section {
      display: grid;
      gap: var(--vw-space-3);
    }
    :host {
      gap: var(--vw-space-5);
    }
    vw-inspection-readings {
      padding: var(--vw-space-4);
    }
    ul {
      display: grid;
      gap: var(--vw-space-2);
      margin: 0;
      padding: 0;
      list-style: none;
    }
    li a {
      display: flex;
      gap: var(--vw-space-3);
      align-items: center;
      min-height: 56px;
      padding: var(--vw-space-2) var(--vw-space-4);
      background: var(--vw-amber-tint);
      border-radius: var(--vw-radius-touch);
      color: var(--vw-ink);
      text-decoration: none;
    }
    li a > span {
      display: grid;
      flex: 1;
    }
    li a vw-icon:first-child {
      color: var(--vw-amber-ink);
    }
    li a.stop {
      background: var(--vw-vermilion-tint);
    }
    li a.stop vw-icon:first-child {
      color: var(--vw-vermilion);
    }
    li .vw-secondary {
      color: var(--vw-ink);
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ClosedSheet {
  private readonly session = inject(Session);
  protected readonly words = inject(FindingWords);

  readonly sheet = input.required<TaskSheet>();

  readonly undo = output();

  protected readonly mayGoOn = computed(() => this.session.can('today.read'));
  protected readonly photoIds = computed(() =>
    (this.sheet().inspection?.readings ?? []).flatMap(({ reading }) =>
      reading.kind === 'photo' ? reading.photoIds : [],
    ),
  );
}
