import {
  ChangeDetectionStrategy,
  Component,
  computed,
  inject,
  input,
  LOCALE_ID,
  output,
} from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatDialog } from '@angular/material/dialog';
import type { ComponentKind } from '@shared/fleet/fleet-words';
import {
  componentKinds,
  componentKindWords,
  pumpFaceWords,
  singleComponents,
} from '@shared/fleet/fleet-words';
import { LanguageChoice } from '../../session/language-choice';
import { Icon } from '../../ui/icon/icon';
import { Notices } from '../../ui/notice/notices';
import { DayPipe } from '../day-pipe';
import { fleetFaultLine } from '../fleet-problem';
import { causeWord, nameplateWords, partIcons } from '../fleet-words';
import type { PartQuestion } from '../part-dialogs/part-dialog';
import { PartDialog } from '../part-dialogs/part-dialog';
import type { RemovalQuestion } from '../part-dialogs/removal-dialog';
import { RemovalDialog } from '../part-dialogs/removal-dialog';
import type { Part, Unit } from '../unit-api';
import { UnitApi } from '../unit-api';

/** The parts of a unit: those in it now, and those that came off. */
@Component({
  selector: 'vw-unit-parts',
  imports: [DayPipe, Icon, MatButton],
  templateUrl: './unit-parts.html',
  styleUrl: './unit-parts.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class UnitParts {
  private readonly api = inject(UnitApi);
  private readonly dialog = inject(MatDialog);
  private readonly notices = inject(Notices);
  private readonly locale = inject(LOCALE_ID);
  protected readonly language = inject(LanguageChoice).current;

  readonly unit = input.required<Unit>();

  /** A part was added, corrected or taken off. */
  readonly changed = output();

  protected readonly icons = partIcons;
  protected readonly kindWords = componentKindWords;
  protected readonly mayEdit = computed(() => this.unit().mayEdit && !this.unit().retiredAt);
  /** In the order of the kinds. */
  protected readonly fitted = computed(() =>
    componentKinds.flatMap((kind) =>
      this.unit().components.filter((part) => part.kind === kind && part.removedOn === null),
    ),
  );
  protected readonly gone = computed(() =>
    this.unit().components.filter((part) => part.removedOn !== null),
  );
  /** Kinds of which the unit can take one more. */
  protected readonly open = computed(() => componentKinds.filter((kind) => this.hasRoom(kind)));

  protected details(part: Part): string {
    return [
      part.model,
      part.pumpFace && pumpFaceWords[part.pumpFace][this.language],
      nameplateWords(part.nameplate, this.locale),
    ]
      .filter(Boolean)
      .join(' · ');
  }

  protected cause(part: Part): string {
    return causeWord(part.removalCause, this.language);
  }

  /** What came off can be said never to have come off while its place is free. */
  protected mayUndo(part: Part): boolean {
    return this.mayEdit() && this.hasRoom(part.kind);
  }

  protected add(kind: ComponentKind): void {
    this.edit({ unitId: this.unit().id, kind });
  }

  protected correct(part: Part): void {
    this.edit({ unitId: this.unit().id, kind: part.kind, part });
  }

  protected takeOff(part: Part, replace: boolean): void {
    const question: RemovalQuestion = { part, replace, timeZone: this.unit().timeZone };
    this.dialog
      .open<RemovalDialog, RemovalQuestion, Part>(RemovalDialog, {
        data: question,
        width: '42rem',
        maxWidth: 'calc(100vw - 32px)',
      })
      .afterClosed()
      .subscribe((saved) => {
        if (!saved) return;
        this.changed.emit();
        const word = componentKindWords[part.kind][this.language];
        if (replace) {
          this.notices.tell({ text: $localize`:@@fleet.part-replaced:${word}:kind: replaced.` });
        } else {
          this.notices.offerUndo($localize`:@@fleet.part-removed:${word}:kind: taken off.`, () =>
            this.undo(saved),
          );
        }
      });
  }

  protected undo(part: Pick<Part, 'id' | 'version'>): void {
    this.api.undoRemoval(part).subscribe({
      next: () => this.changed.emit(),
      error: (failure: unknown) => {
        this.notices.tell({ text: fleetFaultLine(failure), urgent: true });
        this.changed.emit();
      },
    });
  }

  private hasRoom(kind: ComponentKind): boolean {
    return !singleComponents.includes(kind) || this.fitted().every((part) => part.kind !== kind);
  }

  private edit(question: PartQuestion): void {
    this.dialog
      .open<PartDialog, PartQuestion, Part>(PartDialog, {
        data: question,
        width: '42rem',
        maxWidth: 'calc(100vw - 32px)',
      })
      .afterClosed()
      .subscribe((saved) => {
        if (saved) this.changed.emit();
      });
  }
}
