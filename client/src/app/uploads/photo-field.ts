import {
  ChangeDetectionStrategy,
  Component,
  computed,
  inject,
  input,
  output,
  signal,
} from '@angular/core';
import { MatButton } from '@angular/material/button';
import { problemWords } from '../problems/problem-words';
import { Icon } from '../ui/icon/icon';
import { PhotoOutbox } from './photo-outbox';
import { PhotoStrip } from './photo-strip';

/** As many as a reading may hold. */
const MOST = 12;

/** Takes photos for a step or a finding and shows those taken. */
@Component({
  selector: 'vw-photo-field',
  imports: [Icon, MatButton, PhotoStrip],
  template: `
    <vw-photo-strip
      [photoIds]="photoIds()"
      [about]="about()"
      [editable]="true"
      (taken)="takeOut($event)"
    />
    @for (refusal of refusals(); track refusal.id) {
      <p class="fault" role="alert">
        <vw-icon name="warning" />
        <span>
          {{ refusal.words }}
          <button matButton type="button" (click)="outbox.sendAll()" i18n="@@uploads.again">
            Send again
          </button>
        </span>
      </p>
    }
    @if (photoIds().length < most) {
      <label class="add">
        <input
          type="file"
          accept="image/*"
          [disabled]="busy()"
          (change)="add($any($event.target))"
        />
        <span class="face">
          <vw-icon name="camera" />
          @if (busy()) {
            <ng-container i18n="@@uploads.working">One moment</ng-container>
          } @else if (photoIds().length === 0) {
            <ng-container i18n="@@uploads.take">Take a photo</ng-container>
          } @else {
            <ng-container i18n="@@uploads.another">Another photo</ng-container>
          }
          <span class="vw-hidden">: {{ about() }}</span>
        </span>
      </label>
    }
  `,
  styles: `
    :host {
      display: grid;
      gap: var(--vw-space-3);
    }
    .add {
      position: relative;
      display: block;
      cursor: pointer;
    }
    .add input {
      position: absolute;
      inset: 0;
      opacity: 0;
      cursor: pointer;
    }
    .face {
      display: flex;
      gap: var(--vw-space-2);
      align-items: center;
      justify-content: center;
      min-height: 52px;
      border: 1px dashed var(--vw-edge);
      border-radius: var(--vw-radius-touch);
      color: var(--vw-kelp);
      font-weight: 600;
    }
    .add:hover .face {
      background: var(--vw-hover);
    }
    .add input:focus-visible + .face {
      outline: 2px solid var(--vw-kelp);
      outline-offset: 2px;
    }
    .fault {
      display: flex;
      gap: var(--vw-space-2);
      color: var(--vw-vermilion);
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PhotoField {
  protected readonly outbox = inject(PhotoOutbox);

  readonly photoIds = input.required<readonly string[]>();
  readonly storeId = input.required<string>();
  readonly about = input.required<string>();

  readonly photoIdsChange = output<readonly string[]>();

  protected readonly most = MOST;
  protected readonly busy = signal(false);
  protected readonly refusals = computed(() =>
    this.outbox
      .refusals()
      .filter(({ id }) => this.photoIds().includes(id))
      .map(({ id, problem }) => ({
        id,
        words:
          problem.status === 0
            ? $localize`:@@uploads.kept:No network: the photo is kept on this device.`
            : `${problemWords(problem).title}. ${problemWords(problem).advice}`,
      })),
  );

  protected async add(input: HTMLInputElement): Promise<void> {
    const file = input.files?.[0];
    // The same photo may be chosen again after it was taken out.
    input.value = '';
    if (!file) return;
    this.busy.set(true);
    try {
      const id = await this.outbox.add(file, this.storeId());
      this.photoIdsChange.emit([...this.photoIds(), id]);
    } finally {
      this.busy.set(false);
    }
  }

  protected takeOut(id: string): void {
    this.photoIdsChange.emit(this.photoIds().filter((it) => it !== id));
    void this.outbox.drop(id);
  }
}
