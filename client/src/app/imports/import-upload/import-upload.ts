import {
  ChangeDetectionStrategy,
  Component,
  computed,
  inject,
  input,
  linkedSignal,
  signal,
} from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatRadioButton, MatRadioGroup } from '@angular/material/radio';
import { Router } from '@angular/router';
import type { ImportKind } from '@shared/imports/import-fields';
import { importKinds } from '@shared/imports/import-fields';
import { importLimits } from '@shared/imports/import-limits';
import { newId } from '../../api/new-id';
import { toProblem } from '../../problems/problem';
import { problemWords } from '../../problems/problem-words';
import { Icon } from '../../ui/icon/icon';
import { PageHeader } from '../../ui/page-header/page-header';
import { ProgressLine } from '../../ui/progress-line/progress-line';
import { ImportSteps } from '../import-page/import-steps';
import { importKindNote, importKindWord } from '../import-words';
import { ImportsApi } from '../imports-api';

/** In the order in which most need them: one file of units is enough to begin. */
const ordered: readonly ImportKind[] = ['units', 'stores', 'components', 'chains', 'regions'];

/** Chooses what a file is about, and sends it. */
@Component({
  selector: 'vw-import-upload',
  imports: [Icon, ImportSteps, MatButton, MatRadioButton, MatRadioGroup, PageHeader, ProgressLine],
  templateUrl: './import-upload.html',
  styleUrl: './import-upload.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ImportUpload {
  private readonly api = inject(ImportsApi);
  private readonly router = inject(Router);

  readonly kind = input<ImportKind, string | undefined>('units', {
    transform: (value) => importKinds.find((kind) => kind === value) ?? 'units',
  });

  protected readonly kinds = ordered.map((value) => ({
    value,
    label: importKindWord(value),
    note: importKindNote(value),
  }));
  protected readonly chosen = linkedSignal(() => this.kind());
  protected readonly csv = computed(() => this.api.template(this.chosen(), 'csv'));
  protected readonly xlsx = computed(() => this.api.template(this.chosen(), 'xlsx'));
  protected readonly file = signal<File | null>(null);
  protected readonly over = signal(false);
  protected readonly sending = signal(false);
  protected readonly fault = signal('');
  protected readonly megabytes = importLimits.fileBytes / 1_000_000;

  protected picked(event: Event): void {
    const input = event.target as HTMLInputElement;
    this.take(input.files?.[0]);
    // The same file, mended, can be picked again.
    input.value = '';
  }

  protected hover(event: DragEvent, over: boolean): void {
    event.preventDefault();
    this.over.set(over);
  }

  protected dropped(event: DragEvent): void {
    event.preventDefault();
    this.over.set(false);
    this.take(event.dataTransfer?.files[0]);
  }

  protected send(): void {
    const file = this.file();
    if (!file) {
      this.fault.set($localize`:@@imports.fault.none:Choose a file first.`);
      return;
    }
    this.fault.set('');
    this.sending.set(true);
    this.api.upload(newId(), this.chosen(), file).subscribe({
      next: ({ id }) => void this.router.navigate(['/fleet/imports', id], { replaceUrl: true }),
      error: (failure: unknown) => {
        this.sending.set(false);
        const problem = toProblem(failure);
        const words = problemWords(problem);
        this.fault.set(problem.errors[0]?.message ?? `${words.title}. ${words.advice}`);
      },
    });
  }

  private take(file: File | undefined): void {
    if (!file) return;
    this.fault.set('');
    if (!/\.(csv|xlsx)$/i.test(file.name)) {
      this.fault.set(
        $localize`:@@imports.fault.type:Only CSV and Excel files (.csv, .xlsx) can be read. Save it as one of these.`,
      );
    } else if (file.size > importLimits.fileBytes) {
      this.fault.set(
        $localize`:@@imports.fault.size:The file is larger than ${this.megabytes}:max: MB. Part it in two.`,
      );
    } else this.file.set(file);
  }
}
