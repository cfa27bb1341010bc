import { ChangeDetectionStrategy, Component, computed, inject } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { Router } from '@angular/router';
import { filter, switchMap } from 'rxjs';
import { ProblemView } from '../../problems/problem-view';
import { problemWords } from '../../problems/problem-words';
import { Session } from '../../session/session';
import { Confirm } from '../../ui/confirm-dialog/confirm';
import { Notices } from '../../ui/notice/notices';
import { PageLoading } from '../../ui/page-states/page-loading';
import { TimeInZonePipe } from '../../ui/text/time-in-zone-pipe';
import type { OwnSession } from '../account-api';
import { AccountApi } from '../account-api';

/** Where the person is signed in, each of which they can end. */
@Component({
  selector: 'vw-session-list',
  imports: [MatButton, PageLoading, ProblemView, TimeInZonePipe],
  templateUrl: './session-list.html',
  styleUrls: ['./section.scss', './session-list.scss'],
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SessionList {
  private readonly api = inject(AccountApi);
  protected readonly session = inject(Session);
  private readonly router = inject(Router);
  private readonly notices = inject(Notices);
  private readonly confirm = inject(Confirm);

  protected readonly list = this.api.sessions();
  protected readonly sessions = computed(() =>
    this.list.hasValue() ? this.list.value().sessions : [],
  );

  protected end(session: OwnSession): void {
    this.api.endSession(session.id).subscribe({
      next: () => {
        this.list.reload();
        this.notices.tell({ text: $localize`:@@sign-in.session-ended:That device is signed out.` });
      },
      error: (failure: unknown) => this.tellFault(failure),
    });
  }

  protected endAll(): void {
    this.confirm
      .ask({
        title: $localize`:@@sign-in.everywhere-ask:Sign out everywhere?`,
        text: $localize`:@@sign-in.everywhere-text:Every device, this one too, must sign in again. Work not yet sent from another device stays on it until then.`,
        yes: $localize`:@@sign-in.everywhere:Sign out everywhere`,
      })
      .pipe(
        filter(Boolean),
        switchMap(() => this.api.endAllSessions()),
      )
      .subscribe({
        next: () => {
          this.session.forget();
          void this.router.navigateByUrl('/sign-in');
        },
        error: (failure: unknown) => this.tellFault(failure),
      });
  }

  private tellFault(failure: unknown): void {
    const words = problemWords(failure);
    this.notices.tell({ text: `${words.title}. ${words.advice}`, urgent: true });
  }
}
