import type { ElementRef } from '@angular/core';
import {
  ChangeDetectionStrategy,
  Component,
  effect,
  inject,
  input,
  signal,
  viewChild,
} from '@angular/core';
import { MatButton } from '@angular/material/button';
import { ProblemView } from '../../problems/problem-view';
import { problemWords } from '../../problems/problem-words';
import { Session } from '../../session/session';
import { kept } from '../../tasks/kept';
import { Notices } from '../../ui/notice/notices';
import { PageHeader } from '../../ui/page-header/page-header';
import { PageLoading } from '../../ui/page-states/page-loading';
import { TimeInZonePipe } from '../../ui/text/time-in-zone-pipe';
import { LetterState } from '../letter-state';
import { kindWord } from '../letter-words';
import { LettersApi } from '../letters-api';

/** One letter: how far it has come, what it says, and a second try where it was refused. */
@Component({
  selector: 'vw-letter-page',
  imports: [LetterState, MatButton, PageHeader, PageLoading, ProblemView, TimeInZonePipe],
  templateUrl: './letter-page.html',
  styleUrl: './letter-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class LetterPage {
  private readonly api = inject(LettersApi);
  private readonly notices = inject(Notices);
  private readonly session = inject(Session);
  protected readonly zone = this.session.timeZone;
  protected readonly mayRetry = this.session.can('mail.retry');

  readonly id = input.required<string>();

  protected readonly letter = this.api.one(() => this.id());
  protected readonly shown = kept(this.letter);
  protected readonly busy = signal(false);
  protected readonly kindWord = kindWord;
  private readonly frame = viewChild<ElementRef<HTMLIFrameElement>>('frame');

  constructor() {
    // Set on the element, as a binding would have to bypass the sanitizer, which our policy forbids.
    // The address is our own, and what it answers may run and load nothing.
    effect(() => {
      const frame = this.frame()?.nativeElement;
      if (frame) frame.src = this.api.pageOf(this.id());
    });
  }

  protected retry(id: string): void {
    this.busy.set(true);
    this.api.retry([id]).subscribe({
      next: () => {
        this.busy.set(false);
        this.letter.reload();
        this.notices.tell({ text: $localize`:@@letters.retried-one:It will be tried again.` });
      },
      error: (failure: unknown) => {
        this.busy.set(false);
        const { title, advice } = problemWords(failure);
        this.notices.tell({ text: `${title}. ${advice}`, urgent: true });
      },
    });
  }
}
