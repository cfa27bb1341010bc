import {
  ChangeDetectionStrategy,
  Component,
  computed,
  effect,
  inject,
  input,
  signal,
  viewChild,
} from '@angular/core';
import { ReactiveFormsModule } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { MatError, MatFormField, MatHint, MatLabel } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { Router } from '@angular/router';
import type { ProcedureContent } from '@shared/procedures/procedure-content';
import type { Observable } from 'rxjs';
import { switchMap, tap } from 'rxjs';
import { newId } from '../../api/new-id';
import { showInForm } from '../../problems/form-problems';
import { toProblem } from '../../problems/problem';
import { problemWords } from '../../problems/problem-words';
import { LanguageChoice } from '../../session/language-choice';
import { FieldError } from '../../ui/form/field-error';
import { ProblemSummary } from '../../ui/form/problem-summary';
import { Notices } from '../../ui/notice/notices';
import { PageHeader } from '../../ui/page-header/page-header';
import { PageEmpty } from '../../ui/page-states/page-empty';
import { PageError } from '../../ui/page-states/page-error';
import { PageLoading } from '../../ui/page-states/page-loading';
import { ProcedureView } from '../procedure-view/procedure-view';
import type { Procedure, ProcedureVersion } from '../procedures-api';
import { ProceduresApi } from '../procedures-api';
import { VersionChanges } from '../version-changes/version-changes';
import { contentOf, draftForm, emptyContent } from './draft-form';
import { draftFaults } from './draft-faults';
import { draftLabels } from './draft-labels';
import type { HoldsWork } from '../../ui/confirm-dialog/leave-unsaved-guard';
import { StepList } from './step-list';
import { TextList } from './text-list';
import { TextPair } from './text-pair';

/** Writes a draft in both languages, and publishes it. */
@Component({
  selector: 'vw-procedure-editor',
  imports: [
    FieldError,
    MatButton,
    MatError,
    MatFormField,
    MatHint,
    MatInput,
    MatLabel,
    PageEmpty,
    PageError,
    PageHeader,
    PageLoading,
    ProblemSummary,
    ProcedureView,
    ReactiveFormsModule,
    StepList,
    TextList,
    TextPair,
    VersionChanges,
  ],
  templateUrl: './procedure-editor.html',
  styleUrl: './procedure-editor.scss',
  host: { '(window:beforeunload)': 'askBeforeUnload($event)' },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ProcedureEditor implements HoldsWork {
  private readonly api = inject(ProceduresApi);
  private readonly router = inject(Router);
  private readonly notices = inject(Notices);
  protected readonly language = inject(LanguageChoice).current;

  /** Absent for a new procedure. */
  readonly id = input<string>();

  protected readonly resource = this.api.one(() => this.id());
  protected readonly fault = computed(() => {
    const error = this.resource.error();
    return error ? problemWords(error) : null;
  });
  private readonly base = signal<{ readonly id: string; readonly version: number } | null>(null);
  protected readonly form = signal(draftForm('', emptyContent));
  protected readonly ready = computed(() => this.id() === undefined || this.base() !== null);
  protected readonly noDraft = computed(
    () => this.resource.hasValue() && draftOf(this.resource.value()) === undefined,
  );
  protected readonly isNew = computed(() => this.base() === null);
  protected readonly busy = signal(false);
  protected readonly tries = signal(0);
  protected readonly general = signal<readonly string[]>([]);
  protected readonly labels = signal<Readonly<Record<string, string>>>({});
  protected readonly preview = signal<ProcedureContent | null>(null);
  /** What somebody else saved meanwhile, beside what stands here. */
  protected readonly conflict = signal<{
    readonly theirs: ProcedureVersion;
    readonly mine: ProcedureContent;
  } | null>(null);
  private readonly stepList = viewChild(StepList);

  protected readonly words = {
    title: $localize`:@@procedures.field.title:Title`,
    purpose: $localize`:@@procedures.field.purpose:Purpose`,
    caution: $localize`:@@procedures.field.caution:Caution`,
    tool: $localize`:@@procedures.field.tool:Tool`,
    part: $localize`:@@procedures.field.part:Part`,
  };

  protected readonly newHeading = $localize`:@@procedures.new:New procedure`;

  constructor() {
    effect(() => {
      const procedure = this.resource.hasValue() ? this.resource.value() : null;
      const draft = procedure && draftOf(procedure);
      // The form is filled once; later answers of the server must not undo what is being written.
      if (procedure && draft && this.base() === null) this.fill(procedure, draft);
    });
  }

  readonly hasUnsavedWork = (): boolean => this.form().dirty;

  protected askBeforeUnload(event: BeforeUnloadEvent): void {
    if (this.hasUnsavedWork()) event.preventDefault();
  }

  protected togglePreview(): void {
    this.preview.update((shown) => (shown ? null : contentOf(this.form())));
  }

  protected save(): void {
    this.send((saved) => {
      this.notices.tell({ text: $localize`:@@procedures.saved:Draft saved.` });
      if (this.id() === undefined) {
        void this.router.navigate(['/procedures', saved.id, 'edit'], { replaceUrl: true });
      }
    });
  }

  protected publish(): void {
    this.send(
      (published) => {
        this.notices.tell({ text: $localize`:@@procedures.published:Published.` });
        void this.router.navigate(['/procedures', published.id]);
      },
      (saved) => this.api.publish(saved.id, draftOf(saved)?.version ?? 0),
    );
  }

  protected takeTheirs(): void {
    const { theirs } = this.conflict() ?? {};
    const base = this.base();
    if (!theirs || !base) return;
    this.base.set({ ...base, version: theirs.version });
    this.form.set(draftForm(this.form().controls.code.value, theirs.content));
    this.conflict.set(null);
    this.general.set([]);
  }

  protected keepMine(): void {
    const { theirs } = this.conflict() ?? {};
    const base = this.base();
    if (!theirs || !base) return;
    this.base.set({ ...base, version: theirs.version });
    this.conflict.set(null);
    this.save();
  }

  private fill(procedure: Procedure, draft: ProcedureVersion): void {
    this.base.set({ id: procedure.id, version: draft.version });
    const form = draftForm(procedure.code, draft.content);
    form.controls.code.disable();
    this.form.set(form);
  }

  /** Saves, then does what comes after; what fails is shown at its field. */
  private send(
    done: (procedure: Procedure) => void,
    after?: (saved: Procedure) => Observable<Procedure>,
  ): void {
    const form = this.form();
    this.general.set([]);
    if (form.invalid && !form.controls.code.valid) form.controls.code.markAsTouched();
    const content = contentOf(form);
    const base = this.base();
    const saving = base
      ? this.api.saveDraft(base.id, base.version, content)
      : this.api.create(this.ownId, form.controls.code.value.trim(), content);
    const keep = tap((saved: Procedure) => {
      this.base.set({ id: saved.id, version: draftOf(saved)?.version ?? 0 });
      form.markAsPristine();
    });
    this.busy.set(true);
    saving
      .pipe(
        keep,
        switchMap((saved) => (after ? after(saved) : [saved])),
      )
      .subscribe({
        next: (procedure) => {
          this.busy.set(false);
          this.preview.update((shown) => shown && content);
          done(procedure);
        },
        error: (failure: unknown) => {
          this.busy.set(false);
          this.refused(failure, content);
        },
      });
  }

  /** Made once, so that sending twice creates once. */
  private readonly ownId = newId();

  private refused(failure: unknown, mine: ProcedureContent): void {
    const form = this.form();
    this.general.set(showInForm(form, draftFaults(failure)));
    this.labels.set(draftLabels(form));
    this.stepList()?.openFaulty();
    // The opened steps must be drawn before the summary's links can lead into them.
    setTimeout(() => this.tries.update((count) => count + 1));
    const base = this.base();
    if (base && toProblem(failure).code === 'changed-meanwhile') {
      this.api.read(base.id).subscribe((now) => {
        const theirs = draftOf(now);
        if (theirs) this.conflict.set({ theirs, mine });
      });
    }
  }
}

function draftOf(procedure: Procedure): ProcedureVersion | undefined {
  return procedure.versions.find(({ publishedAt }) => publishedAt === null);
}
