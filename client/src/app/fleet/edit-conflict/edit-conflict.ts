import { ChangeDetectionStrategy, Component, input, output } from '@angular/core';
import { MatButton } from '@angular/material/button';

/** A field that two people wrote differently, in words. */
export interface FieldDifference {
  readonly label: string;
  readonly theirs: string;
  readonly mine: string;
}

/** What somebody else saved meanwhile beside what stands here, and the choice between them. */
@Component({
  selector: 'vw-edit-conflict',
  imports: [MatButton],
  template: `
    <section class="vw-sheet" role="alert">
      <h2 i18n="@@fleet.conflict">Somebody else saved this meanwhile</h2>
      @if (differences().length > 0) {
        <p i18n="@@fleet.conflict-text">Here the two differ:</p>
        <table>
          <thead>
            <tr>
              <th scope="col" i18n="@@fleet.conflict-field">Field</th>
              <th scope="col" i18n="@@fleet.conflict-theirs">Theirs, now in force</th>
              <th scope="col" i18n="@@fleet.conflict-mine">Yours</th>
            </tr>
          </thead>
          <tbody>
            @for (row of differences(); track row.label) {
              <tr>
                <th scope="row">{{ row.label }}</th>
                <td>{{ row.theirs || '–' }}</td>
                <td>{{ row.mine || '–' }}</td>
              </tr>
            }
          </tbody>
        </table>
      } @else {
        <p i18n="@@fleet.conflict-same">Their text is the same as yours.</p>
      }
      <div class="vw-row">
        <button
          matButton="outlined"
          type="button"
          (click)="theirsChosen.emit()"
          i18n="@@fleet.take-theirs"
        >
          Go on with theirs
        </button>
        <button
          matButton="filled"
          type="button"
          (click)="mineChosen.emit()"
          i18n="@@fleet.keep-mine"
        >
          Save mine over it
        </button>
      </div>
    </section>
  `,
  styles: `
    section {
      display: grid;
      gap: var(--vw-space-3);
      padding: var(--vw-space-4);
      border-color: var(--vw-amber-ink);
    }
    table {
      width: 100%;
      border-collapse: collapse;
    }
    th,
    td {
      padding: var(--vw-space-2);
      border-bottom: 1px solid var(--vw-line);
      text-align: start;
      vertical-align: top;
      overflow-wrap: anywhere;
      white-space: pre-line;
    }
    thead th {
      color: var(--vw-ink-2);
      font-size: var(--vw-text-tiny);
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class EditConflict {
  readonly differences = input.required<readonly FieldDifference[]>();

  readonly theirsChosen = output();
  readonly mineChosen = output();
}

/**
 * The fields in which two records differ, by the labels given; what has no label is left out.
 * `say` puts a value into words where the value itself is none (an id, hours).
 */
export function differencesOf<T extends object>(
  theirs: T,
  mine: T,
  labels: Readonly<Partial<Record<keyof T & string, string>>>,
  say: (key: keyof T & string, value: unknown) => string = (_, value) => plain(value),
): readonly FieldDifference[] {
  return (Object.keys(labels) as (keyof T & string)[])
    .filter((key) => JSON.stringify(theirs[key]) !== JSON.stringify(mine[key]))
    .map((key) => ({
      label: labels[key] ?? key,
      theirs: say(key, theirs[key]),
      mine: say(key, mine[key]),
    }));
}

const plain = (value: unknown): string =>
  value === null || value === undefined ? '' : String(value);
