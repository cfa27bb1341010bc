import {
  ChangeDetectionStrategy,
  Component,
  computed,
  effect,
  inject,
  input,
  linkedSignal,
  signal,
} from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatButtonToggle, MatButtonToggleGroup } from '@angular/material/button-toggle';
import { MatOption } from '@angular/material/core';
import { MatFormField, MatLabel } from '@angular/material/form-field';
import { MatSelect } from '@angular/material/select';
import { Router, RouterLink } from '@angular/router';
import type { Observable } from 'rxjs';
import { filter, switchMap } from 'rxjs';
import { toProblem } from '../../problems/problem';
import { problemWords } from '../../problems/problem-words';
import type { Language } from '../../session/language-choice';
import { LanguageChoice } from '../../session/language-choice';
import { Session } from '../../session/session';
import { PageTitle } from '../../shell/page-title';
import { Confirm } from '../../ui/confirm-dialog/confirm';
import { Notices } from '../../ui/notice/notices';
import { PageHeader } from '../../ui/page-header/page-header';
import { PageEmpty } from '../../ui/page-states/page-empty';
import { PageError } from '../../ui/page-states/page-error';
import { PageForbidden } from '../../ui/page-states/page-forbidden';
import { PageLoading } from '../../ui/page-states/page-loading';
import { TimeInZonePipe } from '../../ui/text/time-in-zone-pipe';
import { ProcedureView } from '../procedure-view/procedure-view';
import type { Procedure, ProcedureVersion } from '../procedures-api';
import { ProceduresApi } from '../procedures-api';
import { VersionChanges } from '../version-changes/version-changes';

/** One procedure: what it says in any of its versions, what changed, where it is used. */
@Component({
  selector: 'vw-procedure-page',
  imports: [
    MatButton,
    MatButtonToggle,
    MatButtonToggleGroup,
    MatFormField,
    MatLabel,
    MatOption,
    MatSelect,
    PageEmpty,
    PageError,
    PageForbidden,
    PageHeader,
    PageLoading,
    ProcedureView,
    RouterLink,
    TimeInZonePipe,
    VersionChanges,
  ],
  templateUrl: './procedure-page.html',
  styleUrl: './procedure-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ProcedurePage {
  private readonly api = inject(ProceduresApi);
  private readonly router = inject(Router);
  private readonly notices = inject(Notices);
  private readonly confirm = inject(Confirm);

  readonly id = input.required<string>();

  protected readonly resource = this.api.one(() => this.id());
  protected readonly procedure = computed(() =>
    this.resource.hasValue() ? this.resource.value() : null,
  );
  protected readonly problem = computed(() => {
    const error = this.resource.error();
    return error ? toProblem(error) : null;
  });
  protected readonly fault = computed(() => problemWords(this.problem()));
  protected readonly language = signal<Language>(inject(LanguageChoice).current);
  protected readonly zone = inject(Session).timeZone;
  protected readonly busy = signal(false);

  /** Number of the version on show: the one in force, or the draft before there is one. */
  protected readonly number = linkedSignal(() => {
    const versions = this.procedure()?.versions ?? [];
    return (versions.find(({ publishedAt }) => publishedAt) ?? versions[0])?.number ?? 0;
  });
  protected readonly version = computed(
    () => this.procedure()?.versions.find(({ number }) => number === this.number()) ?? null,
  );
  protected readonly draft = computed(
    () => this.procedure()?.versions.find(({ publishedAt }) => publishedAt === null) ?? null,
  );
  /** Number of the version to compare with; 0 for none. */
  protected readonly compareTo = linkedSignal({ source: this.number, computation: () => 0 });
  protected readonly compared = computed(
    () => this.procedure()?.versions.find(({ number }) => number === this.compareTo()) ?? null,
  );
  protected readonly title = computed(() => {
    const title = this.version()?.content.title;
    return title?.[this.language()] || title?.en || title?.es || this.procedure()?.code || '';
  });
  protected readonly nameOf = versionName;

  constructor() {
    const pageTitle = inject(PageTitle);
    effect(() => {
      if (this.title()) pageTitle.set(this.title());
    });
  }

  protected edit(): void {
    const go = () => void this.router.navigate(['/procedures', this.id(), 'edit']);
    if (this.draft()) go();
    else this.run(this.api.beginDraft(this.id()), go);
  }

  protected discard(draft: ProcedureVersion): void {
    this.confirm
      .ask({
        title: $localize`:@@procedures.discard-ask:Throw the draft away?`,
        text: $localize`:@@procedures.discard-text:What was written since the last publication is gone for good.`,
        yes: $localize`:@@procedures.discard:Throw it away`,
        grave: true,
      })
      .pipe(
        filter(Boolean),
        switchMap(() => this.api.discardDraft(this.id(), draft.version)),
      )
      .subscribe({
        next: (procedure) => this.resource.set(procedure),
        error: (failure: unknown) => this.tell(failure),
      });
  }

  protected retire(procedure: Procedure): void {
    this.run(this.api.retire(procedure.id, procedure.version), (retired) => {
      this.notices.offerUndo($localize`:@@procedures.retired:Procedure retired.`, () =>
        this.restore(retired),
      );
    });
  }

  protected restore(procedure: Procedure): void {
    this.run(this.api.restore(procedure.id, procedure.version), () => undefined);
  }

  private run(call: Observable<Procedure>, then: (procedure: Procedure) => void): void {
    this.busy.set(true);
    call.subscribe({
      next: (procedure) => {
        this.busy.set(false);
        this.resource.set(procedure);
        then(procedure);
      },
      error: (failure: unknown) => {
        this.busy.set(false);
        this.tell(failure);
      },
    });
  }

  private tell(failure: unknown): void {
    const words = problemWords(failure);
    this.notices.tell({ text: `${words.title}. ${words.advice}`, urgent: true });
    if (toProblem(failure).status === 409) this.resource.reload();
  }
}

function versionName({ number, publishedAt }: ProcedureVersion): string {
  return publishedAt
    ? $localize`:@@procedures.version-name:version ${number}:number:`
    : $localize`:@@procedures.version-draft:version ${number}:number:, draft`;
}
