import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatDialog } from '@angular/material/dialog';
import { MatDivider } from '@angular/material/divider';
import { MatMenu, MatMenuItem, MatMenuTrigger } from '@angular/material/menu';
import { newId } from '../../api/new-id';
import { problemWords } from '../../problems/problem-words';
import { Icon } from '../../ui/icon/icon';
import { Notices } from '../../ui/notice/notices';
import { Address } from '../address';
import type { SavedView } from './saved-views-api';
import { SavedViewsApi } from './saved-views-api';
import type { ViewQuestion } from './view-dialog';
import { ViewDialog } from './view-dialog';

/** The kept filters of a page: to take one, to keep those now set, to change or forget one. */
@Component({
  selector: 'vw-saved-views',
  imports: [Icon, MatButton, MatDivider, MatMenu, MatMenuItem, MatMenuTrigger],
  templateUrl: './saved-views.html',
  styles: `
    .line {
      display: inline-flex;
      align-items: center;
      gap: 6px;
      max-width: 14rem;
    }
    .name {
      overflow: hidden;
      text-overflow: ellipsis;
      white-space: nowrap;
    }
    .tick {
      margin-right: 6px;
      color: var(--vw-kelp);
    }
    .no-tick {
      display: inline-block;
      width: 1.25em;
      margin-right: 6px;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SavedViews {
  private readonly api = inject(SavedViewsApi);
  private readonly address = inject(Address);
  private readonly dialog = inject(MatDialog);
  private readonly notices = inject(Notices);

  /** Name of the page whose filters are kept. */
  readonly page = input.required<string>();

  private readonly resource = this.api.list(() => this.page());
  protected readonly views = computed(() =>
    this.resource.hasValue() ? this.resource.value().rows : [],
  );
  private readonly mayShare = computed(
    () => this.resource.hasValue() && this.resource.value().mayShare,
  );
  /** The view whose filters are those now set. */
  protected readonly current = computed(() => {
    const here = this.address.text();
    return this.views().find(({ query }) => query === here) ?? null;
  });

  protected take(view: SavedView): void {
    this.address.take(view.query);
  }

  protected save(view?: SavedView): void {
    const data: ViewQuestion = {
      page: this.page(),
      query: this.address.text(),
      mayShare: this.mayShare(),
      view,
    };
    this.dialog
      .open<ViewDialog, ViewQuestion, SavedView>(ViewDialog, {
        data,
        width: '28rem',
        maxWidth: 'calc(100vw - 24px)',
      })
      .afterClosed()
      .subscribe((saved) => {
        if (!saved) return;
        this.resource.reload();
        this.notices.tell({
          text: $localize`:@@tasks.views.saved:View “${saved.name}:name:” saved.`,
        });
      });
  }

  protected forget(view: SavedView): void {
    this.api.remove(view).subscribe({
      next: () => {
        this.resource.reload();
        this.notices.offerUndo(
          $localize`:@@tasks.views.forgotten:View “${view.name}:name:” removed.`,
          () => this.bringBack(view),
        );
      },
      error: (failure: unknown) => this.fail(failure),
    });
  }

  private bringBack({ page, name, query, shared }: SavedView): void {
    this.api.save({ id: newId(), page, name, query, shared }).subscribe({
      next: () => this.resource.reload(),
      error: (failure: unknown) => this.fail(failure),
    });
  }

  private fail(failure: unknown): void {
    const { title, advice } = problemWords(failure);
    this.notices.tell({ text: `${title}. ${advice}`, urgent: true });
    this.resource.reload();
  }
}
