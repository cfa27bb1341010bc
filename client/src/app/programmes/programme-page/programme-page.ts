import {
  ChangeDetectionStrategy,
  Component,
  computed,
  effect,
  inject,
  input,
  LOCALE_ID,
  signal,
} from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatDialog } from '@angular/material/dialog';
import { RouterLink } from '@angular/router';
import type { Observable } from 'rxjs';
import { toProblem } from '../../problems/problem';
import { problemWords } from '../../problems/problem-words';
import { PageTitle } from '../../shell/page-title';
import { Figure } from '../../ui/figure/figure';
import { Notices } from '../../ui/notice/notices';
import { PageHeader } from '../../ui/page-header/page-header';
import { PageEmpty } from '../../ui/page-states/page-empty';
import { PageError } from '../../ui/page-states/page-error';
import { PageForbidden } from '../../ui/page-states/page-forbidden';
import { PageLoading } from '../../ui/page-states/page-loading';
import type { EnrolQuestion } from '../enrol-dialog/enrol-dialog';
import { EnrolDialog } from '../enrol-dialog/enrol-dialog';
import { ProgrammeDialog } from '../programme-dialog/programme-dialog';
import { datesWords, reachWords, scopeWord } from '../programme-words';
import type { Enrolment, Programme } from '../programmes-api';
import { ProgrammesApi } from '../programmes-api';
import { RuleCard } from './rule-card';

/** One programme: its rules in words with their next dates, and who is enrolled. */
@Component({
  selector: 'vw-programme-page',
  imports: [
    Figure,
    MatButton,
    PageEmpty,
    PageError,
    PageForbidden,
    PageHeader,
    PageLoading,
    RouterLink,
    RuleCard,
  ],
  templateUrl: './programme-page.html',
  styleUrl: './programme-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ProgrammePage {
  private readonly api = inject(ProgrammesApi);
  private readonly dialog = inject(MatDialog);
  private readonly notices = inject(Notices);
  private readonly locale = inject(LOCALE_ID);

  readonly id = input.required<string>();

  protected readonly resource = this.api.one(() => this.id());
  protected readonly programme = computed(() =>
    this.resource.hasValue() ? this.resource.value() : null,
  );
  protected readonly problem = computed(() => {
    const error = this.resource.error();
    return error ? toProblem(error) : null;
  });
  protected readonly fault = computed(() => problemWords(this.problem()));
  protected readonly busy = signal(false);
  protected readonly scopeWord = scopeWord;
  protected readonly reachWords = reachWords;

  constructor() {
    const title = inject(PageTitle);
    effect(() => {
      const programme = this.programme();
      if (programme) title.set(programme.name);
    });
  }

  protected dates(enrolment: Enrolment): string {
    return datesWords(enrolment, this.locale);
  }

  protected edit(programme: Programme): void {
    this.take(
      this.dialog
        .open<ProgrammeDialog, Programme, Programme>(ProgrammeDialog, {
          data: programme,
          width: '32rem',
        })
        .afterClosed(),
    );
  }

  protected enrol(programme: Programme, enrolment?: Enrolment): void {
    this.take(
      this.dialog
        .open<EnrolDialog, EnrolQuestion, Programme>(EnrolDialog, {
          data: { programme, enrolment },
          width: '34rem',
        })
        .afterClosed(),
    );
  }

  protected unenrol(enrolment: Enrolment): void {
    const { id, label, version, scopeKind, scopeId, exception, fromOn, untilOn } = enrolment;
    const again = { id, scopeKind, scopeId, exception, fromOn, untilOn };
    this.run(this.api.unenrol(id, version), () => {
      this.notices.offerUndo($localize`:@@programmes.unenrolled:${label}:place: removed.`, () =>
        this.run(this.api.enrol(this.id(), again), () => undefined),
      );
    });
  }

  protected retire(programme: Programme): void {
    this.run(this.api.retire(programme.id, programme.version), (retired) => {
      this.notices.offerUndo(
        $localize`:@@programmes.retired:Programme retired; its schedules have ended.`,
        () => this.restore(retired),
      );
    });
  }

  protected restore(programme: Programme): void {
    this.run(this.api.restore(programme.id, programme.version), () => undefined);
  }

  private take(change: Observable<Programme | undefined>): void {
    change.subscribe((programme) => {
      if (programme) this.resource.set(programme);
    });
  }

  private run(call: Observable<Programme>, then: (programme: Programme) => void): void {
    this.busy.set(true);
    call.subscribe({
      next: (programme) => {
        this.busy.set(false);
        this.resource.set(programme);
        then(programme);
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
