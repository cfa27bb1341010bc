import {
  ChangeDetectionStrategy,
  Component,
  computed,
  effect,
  inject,
  input,
  signal,
} from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatDialog } from '@angular/material/dialog';
import { RouterLink } from '@angular/router';
import { toProblem } from '../../problems/problem';
import { ProblemView } from '../../problems/problem-view';
import { problemWords } from '../../problems/problem-words';
import { Session } from '../../session/session';
import { PageTitle } from '../../shell/page-title';
import { Caution } from '../../ui/caution/caution';
import { Icon } from '../../ui/icon/icon';
import { Notices } from '../../ui/notice/notices';
import { PageHeader } from '../../ui/page-header/page-header';
import { PageLoading } from '../../ui/page-states/page-loading';
import { TimeInZonePipe } from '../../ui/text/time-in-zone-pipe';
import { PhotoStrip } from '../../uploads/photo-strip';
import { FindingWords } from '../finding-words';
import type { Finding } from '../findings-api';
import { FindingsApi } from '../findings-api';
import { InspectionReadings } from '../inspection-readings/inspection-readings';
import type { Settled } from '../settle-dialog/settle-dialog';
import { SettleDialog } from '../settle-dialog/settle-dialog';
import { SeverityMark } from '../severity-mark/severity-mark';

/** One finding: what it is put down to, the evidence behind it, its unit, and what was done. */
@Component({
  selector: 'vw-finding-page',
  imports: [
    Caution,
    Icon,
    InspectionReadings,
    MatButton,
    PageHeader,
    PageLoading,
    PhotoStrip,
    ProblemView,
    RouterLink,
    SeverityMark,
    TimeInZonePipe,
  ],
  templateUrl: './finding-page.html',
  styleUrl: './finding-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class FindingPage {
  private readonly api = inject(FindingsApi);
  private readonly dialog = inject(MatDialog);
  private readonly notices = inject(Notices);
  private readonly session = inject(Session);
  protected readonly words = inject(FindingWords);

  readonly id = input.required<string>();

  protected readonly resource = this.api.one(() => this.id());
  protected readonly finding = computed(() =>
    this.resource.hasValue() ? this.resource.value() : null,
  );
  private readonly sheetOf = this.api.sheet(() => this.finding()?.taskId);
  protected readonly sheet = computed(() =>
    this.sheetOf.hasValue() ? this.sheetOf.value() : null,
  );
  protected readonly busy = signal(false);
  protected readonly maySettle = this.session.can('findings.settle');
  /** Photos taken at the steps of the inspection behind the finding. */
  protected readonly inspectionPhotos = computed(() =>
    (this.sheet()?.inspection?.readings ?? []).flatMap(({ reading }) =>
      reading.kind === 'photo' ? reading.photoIds : [],
    ),
  );
  protected readonly title = computed(() => {
    const finding = this.finding();
    return finding ? this.words.cause(finding.cause) : '';
  });
  protected readonly where = computed(() => {
    const finding = this.finding();
    if (!finding) return '';
    const part = finding.componentKind && this.words.component(finding.componentKind).toLowerCase();
    const store = `${finding.storeNumber} ${finding.storeName}`;
    return [store, finding.unitTag, part].filter(Boolean).join(' · ');
  });

  constructor() {
    const pageTitle = inject(PageTitle);
    effect(() => {
      if (this.title()) pageTitle.set(`${this.title()}, ${this.where()}`);
    });
  }

  protected settle(finding: Finding): void {
    this.dialog
      .open<SettleDialog, Finding, Settled>(SettleDialog, {
        data: finding,
        width: '34rem',
        maxWidth: 'calc(100vw - 24px)',
        autoFocus: 'textarea',
      })
      .afterClosed()
      .subscribe((settled) => {
        if (!settled) return;
        this.resource.set(settled.finding);
        const done = $localize`:@@findings.settled-notice:Finding settled.`;
        // New parts stand on the unit from then on: that is corrected there, not undone here.
        if (settled.repaired) this.notices.tell({ text: done });
        else this.notices.offerUndo(done, () => this.reopen(settled.finding));
      });
  }

  protected reopen(finding: Finding): void {
    this.busy.set(true);
    this.api.reopen(finding.id, finding.version).subscribe({
      next: (opened) => {
        this.busy.set(false);
        this.resource.set(opened);
      },
      error: (failure: unknown) => {
        this.busy.set(false);
        const words = problemWords(failure);
        this.notices.tell({ text: `${words.title}. ${words.advice}`, urgent: true });
        if (toProblem(failure).status === 409) this.resource.reload();
      },
    });
  }
}
