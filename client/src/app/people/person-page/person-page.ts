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
import { FormGroup, ReactiveFormsModule } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import type { Observable } from 'rxjs';
import { EditConflict } from '../../fleet/edit-conflict/edit-conflict';
import type { FieldDifference } from '../../fleet/edit-conflict/edit-conflict';
import { ProblemView } from '../../problems/problem-view';
import { Session } from '../../session/session';
import { PageTitle } from '../../shell/page-title';
import { ProblemSummary } from '../../ui/form/problem-summary';
import { Icon } from '../../ui/icon/icon';
import { Notices } from '../../ui/notice/notices';
import { PageHeader } from '../../ui/page-header/page-header';
import { PageLoading } from '../../ui/page-states/page-loading';
import { TimeInZonePipe } from '../../ui/text/time-in-zone-pipe';
import { DetailsFields } from '../details-fields/details-fields';
import { detailsForm, detailsLabels, detailsOf } from '../details-fields/details-form';
import { GrantsEditor } from '../grants-editor/grants-editor';
import { grantsForm, grantsOf } from '../grants-editor/grants-form';
import type { Person } from '../people-api';
import { PeopleApi } from '../people-api';
import { changedMeanwhile, peopleFaultLine, showPeopleFaults } from '../people-problem';
import { grantWords, standingWord } from '../people-words';
import { differencesOfPerson } from './person-differences';

/** One person: what is known of them, what they may do where, and whether they are let in. */
@Component({
  selector: 'vw-person-page',
  imports: [
    DetailsFields,
    EditConflict,
    GrantsEditor,
    Icon,
    MatButton,
    PageHeader,
    PageLoading,
    ProblemSummary,
    ProblemView,
    ReactiveFormsModule,
    TimeInZonePipe,
  ],
  templateUrl: './person-page.html',
  styleUrl: './person-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PersonPage {
  private readonly api = inject(PeopleApi);
  private readonly notices = inject(Notices);
  protected readonly timeZone = inject(Session).timeZone;

  readonly id = input.required<string>();

  protected readonly resource = this.api.one(() => this.id());
  protected readonly person = computed(() =>
    this.resource.hasValue() ? this.resource.value() : null,
  );
  /** Filled once for each person; later answers must not undo what is being written. */
  protected readonly details = linkedSignal({
    source: () => this.person()?.id,
    computation: () => detailsForm(this.person() ?? {}),
  });
  protected readonly roles = linkedSignal({
    source: () => this.person()?.id,
    computation: () => new FormGroup({ roles: grantsForm(this.person()?.roles ?? []) }),
  });
  protected readonly labels = { ...detailsLabels(), roles: $localize`:@@people.roles:Roles` };
  protected readonly busy = signal(false);
  protected readonly tries = signal({ details: 0, roles: 0 });
  protected readonly general = signal<{ details: readonly string[]; roles: readonly string[] }>({
    details: [],
    roles: [],
  });
  protected readonly conflict = signal<{
    readonly theirs: Person;
    readonly part: 'details' | 'roles';
    readonly differences: readonly FieldDifference[];
  } | null>(null);
  protected readonly standingWord = standingWord;
  protected readonly grantWords = grantWords;
  protected readonly isTechnician = computed(
    () => this.person()?.roles.some(({ role }) => role === 'technician') ?? false,
  );
  protected readonly languageName = computed(() =>
    this.person()?.locale === 'es' ? 'Español' : 'English',
  );

  constructor() {
    const title = inject(PageTitle);
    effect(() => {
      const person = this.person();
      if (person) title.set(person.name);
    });
  }

  readonly hasUnsavedWork = (): boolean => this.details().dirty || this.roles().dirty;

  protected save(part: 'details' | 'roles', person: Person): void {
    const form = part === 'details' ? this.details() : this.roles();
    this.general.update((general) => ({ ...general, [part]: [] }));
    if (form.invalid) {
      form.markAllAsTouched();
      this.count(part);
      return;
    }
    const saving =
      part === 'details'
        ? this.api.edit(person.id, person.version, detailsOf(this.details()))
        : this.api.editRoles(person.id, person.version, grantsOf(this.roles().controls.roles));
    this.busy.set(true);
    saving.subscribe({
      next: (saved) => {
        this.busy.set(false);
        this.resource.set(saved);
        this.fill(part, saved);
        this.notices.tell({ text: $localize`:@@people.saved:Saved.` });
      },
      error: (failure: unknown) => {
        this.busy.set(false);
        if (changedMeanwhile(failure)) this.showConflict(part);
        else {
          this.general.update((general) => ({
            ...general,
            [part]: showPeopleFaults(form, failure),
          }));
          this.count(part);
        }
      },
    });
  }

  protected takeTheirs(): void {
    const conflict = this.conflict();
    if (!conflict) return;
    this.conflict.set(null);
    this.resource.set(conflict.theirs);
    this.fill(conflict.part, conflict.theirs);
  }

  protected keepMine(): void {
    const conflict = this.conflict();
    if (!conflict) return;
    this.conflict.set(null);
    this.resource.set(conflict.theirs);
    this.save(conflict.part, conflict.theirs);
  }

  protected setActive(person: Person, active: boolean): void {
    this.run(this.api.setActive(person.id, person.version, active), (changed) => {
      if (active) {
        this.notices.tell({
          text: $localize`:@@people.activated:${person.name}:name: can sign in again.`,
        });
        return;
      }
      this.notices.offerUndo(
        $localize`:@@people.deactivated:${person.name}:name: is signed out and let in no more.`,
        () => this.setActive(changed, true),
      );
    });
  }

  protected inviteAgain(person: Person): void {
    this.run(this.api.inviteAgain(person.id), () =>
      this.notices.tell({
        text: $localize`:@@people.invited:The invitation to ${person.email}:email: is on its way.`,
      }),
    );
  }

  private run(call: Observable<Person>, then: (person: Person) => void): void {
    this.busy.set(true);
    call.subscribe({
      next: (person) => {
        this.busy.set(false);
        this.resource.set(person);
        then(person);
      },
      error: (failure: unknown) => {
        this.busy.set(false);
        this.notices.tell({ text: peopleFaultLine(failure), urgent: true });
        if (changedMeanwhile(failure)) this.resource.reload();
      },
    });
  }

  private showConflict(part: 'details' | 'roles'): void {
    this.api.read(this.id()).subscribe({
      next: (theirs) =>
        this.conflict.set({
          theirs,
          part,
          differences:
            part === 'details'
              ? differencesOfPerson(theirs, detailsOf(this.details()))
              : [
                  {
                    label: this.labels.roles,
                    theirs: theirs.roles.map(grantWords).join('\n'),
                    mine: $localize`:@@people.as-entered:as entered below`,
                  },
                ],
        }),
      error: (failure: unknown) =>
        this.notices.tell({ text: peopleFaultLine(failure), urgent: true }),
    });
  }

  private fill(part: 'details' | 'roles', person: Person): void {
    if (part === 'details') this.details.set(detailsForm(person));
    else this.roles.set(new FormGroup({ roles: grantsForm(person.roles) }));
  }

  private count(part: 'details' | 'roles'): void {
    this.tries.update((tries) => ({ ...tries, [part]: tries[part] + 1 }));
  }
}
