import {
  ChangeDetectionStrategy,
  Component,
  computed,
  DOCUMENT,
  effect,
  inject,
  input,
} from '@angular/core';
import { MatButton } from '@angular/material/button';
import { RouterLink } from '@angular/router';
import { digestBlocks } from '@shared/digests/digest-blocks';
import { digestWords } from '@shared/digests/digest-words';
import { formatMoment, formatMonth } from '@shared/mail/format-moment';
import { ProblemView } from '../../problems/problem-view';
import { LanguageChoice } from '../../session/language-choice';
import { Session } from '../../session/session';
import { PageTitle } from '../../shell/page-title';
import { Icon } from '../../ui/icon/icon';
import { PageHeader } from '../../ui/page-header/page-header';
import { PageLoading } from '../../ui/page-states/page-loading';
import { DigestBlocks } from '../digest-blocks/digest-blocks';
import { DigestsApi } from '../digests-api';
import { MonthBars } from '../month-bars/month-bars';

/** One digest: what its letter says, with every row, to be read or printed. */
@Component({
  selector: 'vw-digest-page',
  imports: [
    DigestBlocks,
    Icon,
    MatButton,
    MonthBars,
    PageHeader,
    PageLoading,
    ProblemView,
    RouterLink,
  ],
  templateUrl: './digest-page.html',
  styleUrl: './digest-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class DigestPage {
  private readonly language = inject(LanguageChoice).current;
  private readonly timeZone = inject(Session).timeZone;
  private readonly window = inject(DOCUMENT).defaultView;

  readonly id = input.required<string>();

  protected readonly digest = inject(DigestsApi).one(() => this.id());
  protected readonly shown = computed(() =>
    this.digest.hasValue() ? (this.digest.value() ?? null) : null,
  );
  protected readonly title = computed(() => {
    const content = this.shown()?.content;
    if (!content) return '';
    const month = formatMonth(content.month, this.language);
    return digestWords[this.language].title(content.chainName, month);
  });
  protected readonly made = computed(() => {
    const shown = this.shown();
    if (!shown) return '';
    const moment = formatMoment(Date.parse(shown.madeAt), this.timeZone(), this.language);
    return $localize`:@@digests.made:Made ${moment}:moment:; its figures stay as they were then.`;
  });
  protected readonly blocks = computed(() => {
    const content = this.shown()?.content;
    if (!content) return [];
    return digestBlocks({ content, locale: this.language, baseUrl: '', mostRows: Infinity });
  });
  /** The same chain and month among the figures of today. */
  protected readonly live = computed(() => {
    const shown = this.shown();
    const month = shown?.content.month;
    return { chain: shown?.chainId, from: month, to: month };
  });

  constructor() {
    const pageTitle = inject(PageTitle);
    effect(() => {
      if (this.title()) pageTitle.set(this.title());
    });
  }

  protected print(): void {
    this.window?.print();
  }
}
