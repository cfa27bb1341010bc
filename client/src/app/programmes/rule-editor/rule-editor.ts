import {
  ChangeDetectionStrategy,
  Component,
  computed,
  effect,
  inject,
  input,
  signal,
} from '@angular/core';
import { ReactiveFormsModule } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { MatDialog } from '@angular/material/dialog';
import { Router } from '@angular/router';
import { dateAt } from '@shared/calendar/instant-of';
import type { RuleDefinition } from '@shared/programmes/rule-definition';
import type { Observable } from 'rxjs';
import { newId } from '../../api/new-id';
import { toProblem } from '../../problems/problem';
import { problemWords } from '../../problems/problem-words';
import { LanguageChoice } from '../../session/language-choice';
import { Session } from '../../session/session';
import { PageTitle } from '../../shell/page-title';
import { ProblemSummary } from '../../ui/form/problem-summary';
import { Notices } from '../../ui/notice/notices';
import type { HoldsWork } from '../../ui/confirm-dialog/leave-unsaved-guard';
import { PageHeader } from '../../ui/page-header/page-header';
import { PageError } from '../../ui/page-states/page-error';
import { PageForbidden } from '../../ui/page-states/page-forbidden';
import { PageLoading } from '../../ui/page-states/page-loading';
import type { Rule } from '../programmes-api';
import { ProgrammesApi } from '../programmes-api';
import { RuleHistory } from '../rule-history/rule-history';
import type { EditToJudge } from './edit-preview';
import { EditPreview } from './edit-preview';
import { procedureTitles } from './procedure-titles';
import type { Conflict } from './rule-conflict';
import { RuleConflict } from './rule-conflict';
import { RuleFields } from './rule-fields';
import { definitionOf, newDefinition, ruleForm } from './rule-form';
import { ruleLabels, showRuleFaults } from './rule-labels';
import { RuleView } from './rule-view';

type Base = Pick<Rule, 'id' | 'version'>;

/** One rule: what it says, in a form for those who may change it, and what it said before. */
@Component({
  selector: 'vw-rule-editor',
  imports: [
    MatButton,
    PageError,
    PageForbidden,
    PageHeader,
    PageLoading,
    ProblemSummary,
    ReactiveFormsModule,
    RuleConflict,
    RuleFields,
    RuleHistory,
    RuleView,
  ],
  templateUrl: './rule-editor.html',
  styleUrl: './rule-editor.scss',
  host: { '(window:beforeunload)': 'askBeforeUnload($event)' },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class RuleEditor implements HoldsWork {
  private readonly api = inject(ProgrammesApi);
  private readonly router = inject(Router);
  private readonly dialog = inject(MatDialog);
  private readonly notices = inject(Notices);
  private readonly session = inject(Session);
  protected readonly language = inject(LanguageChoice).current;

  /** Id of the programme. */
  readonly id = input.required<string>();
  /** Absent for a new rule. */
  readonly ruleId = input<string>();

  protected readonly programme = this.api.one(() => this.id());
  protected readonly rule = this.api.rule(() => this.ruleId());
  protected readonly procedures = this.api.procedures(this.language);

  protected readonly problem = computed(() => {
    const error = this.programme.error() ?? this.rule.error();
    return error ? toProblem(error) : null;
  });
  protected readonly fault = computed(() => problemWords(this.problem()));
  /** The rule as the server last told it; null for a new one. */
  protected readonly known = computed(() => (this.rule.hasValue() ? this.rule.value() : null));
  protected readonly mayEdit = computed(
    () =>
      (this.ruleId() ? this.known()?.mayEdit : undefined) ??
      (this.programme.hasValue() && this.programme.value().mayEdit),
  );
  protected readonly form = signal(
    ruleForm(newDefinition(dateAt(Date.now(), this.session.timeZone()))),
  );
  /** The rule and version that the form was filled from; null for a new rule. */
  private readonly filledFrom = signal<Base | null>(null);
  protected readonly ready = computed(() =>
    this.ruleId() ? this.filledFrom() !== null : this.programme.hasValue(),
  );
  protected readonly choices = computed(() =>
    this.procedures.hasValue() ? this.procedures.value().rows : [],
  );
  protected readonly titles = computed(() =>
    procedureTitles(this.choices(), this.known(), this.language),
  );

  protected readonly busy = signal(false);
  protected readonly tries = signal(0);
  protected readonly general = signal<readonly string[]>([]);
  protected readonly labels = ruleLabels();
  protected readonly newHeading = $localize`:@@programmes.new-rule:New rule`;
  /** What somebody else saved meanwhile, beside what stands here. */
  protected readonly conflict = signal<Conflict | null>(null);

  /** Made once, so that sending twice adds once. */
  private readonly ownId = newId();

  constructor() {
    const title = inject(PageTitle);
    effect(() => {
      const rule = this.known();
      if (!rule) return;
      title.set(rule.name);
      // The form is filled once; later answers of the server must not undo what is being written.
      if (this.filledFrom()?.id !== rule.id) this.fill(rule);
    });
  }

  readonly hasUnsavedWork = (): boolean => this.form().dirty;

  protected askBeforeUnload(event: BeforeUnloadEvent): void {
    if (this.hasUnsavedWork()) event.preventDefault();
  }

  protected save(): void {
    const form = this.form();
    this.general.set([]);
    if (form.invalid) {
      form.markAllAsTouched();
      this.tries.update((count) => count + 1);
      return;
    }
    const rule = definitionOf(form);
    const base = this.filledFrom();
    if (base) this.judge(base, rule);
    else this.add(rule);
  }

  protected retire(rule: Rule): void {
    this.run(this.api.retireRule(rule.id, rule.version), (retired) => {
      this.keep(retired);
      this.notices.offerUndo(
        $localize`:@@programmes.rule-retired:Rule retired; its schedules have ended.`,
        () => this.restore(retired),
      );
    });
  }

  protected restore(rule: Rule): void {
    this.run(this.api.restoreRule(rule.id, rule.version), (restored) => this.keep(restored));
  }

  protected takeTheirs(theirs: Rule): void {
    this.conflict.set(null);
    this.general.set([]);
    this.rule.set(theirs);
    this.fill(theirs);
  }

  protected keepMine(theirs: Rule): void {
    this.conflict.set(null);
    this.filledFrom.set(theirs);
    this.save();
  }

  private add(rule: RuleDefinition): void {
    this.run(this.api.addRule(this.id(), this.ownId, rule), () => {
      this.form().markAsPristine();
      this.notices.tell({ text: $localize`:@@programmes.rule-added:Rule added.` });
      void this.router.navigate(['/programmes', this.id()]);
    });
  }

  /** Shows what an edit would do to the tasks, and makes it when that is what was meant. */
  private judge(base: Base, to: RuleDefinition): void {
    const from = this.known();
    if (!from) return;
    this.run(this.api.previewEdit(base.id, base.version, to), (effect) => {
      const revision = from.revision + 1;
      const data: EditToJudge = { from, to, effect, revision, procedures: this.titles() };
      this.dialog
        .open<EditPreview, EditToJudge, true>(EditPreview, { data, width: '38rem' })
        .afterClosed()
        .subscribe((meant) => {
          if (meant) this.edit(base, to);
        });
    });
  }

  private edit(base: Base, rule: RuleDefinition): void {
    this.run(this.api.editRule(base.id, base.version, rule), (saved) => {
      this.form().markAsPristine();
      this.keep(saved);
      this.notices.tell({
        text: $localize`:@@programmes.saved-revision:Saved as revision ${saved.revision}:revision:.`,
      });
    });
  }

  private fill(rule: Rule): void {
    this.filledFrom.set(rule);
    this.form.set(ruleForm(rule));
  }

  /** What the server now has of this rule. */
  private keep(rule: Rule): void {
    this.filledFrom.set(rule);
    this.rule.set(rule);
  }

  private run<T>(call: Observable<T>, then: (reply: T) => void): void {
    this.busy.set(true);
    call.subscribe({
      next: (reply) => {
        this.busy.set(false);
        then(reply);
      },
      error: (failure: unknown) => {
        this.busy.set(false);
        this.refused(failure);
      },
    });
  }

  private refused(failure: unknown): void {
    const form = this.form();
    this.general.set(showRuleFaults(form, failure));
    this.tries.update((count) => count + 1);
    const base = this.filledFrom();
    if (base && toProblem(failure).status === 409) {
      this.api.readRule(base.id).subscribe((theirs) => {
        if (theirs.version !== base.version)
          this.conflict.set({ theirs, mine: definitionOf(form) });
      });
    }
  }
}
