import type { ElementRef } from '@angular/core';
import {
  ChangeDetectionStrategy,
  Component,
  computed,
  inject,
  input,
  output,
  signal,
  viewChild,
} from '@angular/core';
import { MatButton } from '@angular/material/button';
import type { readPhoto, readThumbnail } from '@shared/uploads/uploads-contract';
import { Api } from '../api/api';
import { Icon } from '../ui/icon/icon';
import { PhotoOutbox } from './photo-outbox';

/**
 * Photos in a row, each opening large. With `editable` each can be taken out again:
 * `<vw-photo-strip [photoIds]="finding.photoIds" [about]="title" />`.
 */
@Component({
  selector: 'vw-photo-strip',
  imports: [Icon, MatButton],
  templateUrl: './photo-strip.html',
  styleUrl: './photo-strip.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PhotoStrip {
  private readonly api = inject(Api);
  private readonly outbox = inject(PhotoOutbox);
  private readonly dialog = viewChild.required<ElementRef<HTMLDialogElement>>('dialog');

  readonly photoIds = input.required<readonly string[]>();
  /** What the photos show, for those who cannot see them. */
  readonly about = input.required<string>();
  readonly editable = input(false);

  readonly taken = output<string>();

  private readonly open = signal<string | null>(null);

  protected readonly photos = computed(() =>
    this.photoIds().map((id, index) => ({
      id,
      name: $localize`:@@uploads.photo-of:Photo ${index + 1}:number:: ${this.about()}:about:`,
      small: this.outbox.localAddress(id) ?? this.address('/photos/:id/thumbnail', id),
      waiting: this.outbox.isWaiting(id),
    })),
  );
  protected readonly large = computed(() => {
    const photo = this.photos().find(({ id }) => id === this.open());
    if (!photo) return null;
    const full = this.outbox.localAddress(photo.id) ?? this.address('/photos/:id', photo.id);
    return { ...photo, full };
  });

  protected show(id: string): void {
    this.open.set(id);
    this.dialog().nativeElement.showModal();
  }

  private address(path: '/photos/:id' | '/photos/:id/thumbnail', id: string): string {
    return this.api.address<typeof readPhoto | typeof readThumbnail>(path, { params: { id } });
  }
}
