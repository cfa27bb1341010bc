import { inject, Injectable } from '@angular/core';
import type { Cause, Severity } from '@shared/findings/cause';
import { causes, causeWords, severities, severityWords } from '@shared/findings/cause';
import type { ComponentKind } from '@shared/procedures/step-kind';
import { componentKinds } from '@shared/procedures/step-kind';
import { componentWord } from '../procedures/procedure-words';
import { LanguageChoice } from '../session/language-choice';

/** The words of findings in the reader's language, and the choices made of them. */
@Injectable({ providedIn: 'root' })
export class FindingWords {
  private readonly language = inject(LanguageChoice).current;

  readonly causes = causes.map((value) => ({ value, label: this.cause(value) }));
  readonly severities = severities.map((value) => ({ value, label: this.severity(value) }));
  readonly components = componentKinds.map((value) => ({ value, label: this.component(value) }));

  cause(cause: Cause): string {
    return causeWords[cause][this.language];
  }

  severity(severity: Severity): string {
    return severityWords[severity][this.language];
  }

  component(kind: ComponentKind): string {
    return componentWord(kind);
  }

  /** A text written in both languages; the other one where ours is empty. */
  text(both: { readonly en: string; readonly es: string }): string {
    return both[this.language] || both.en || both.es;
  }
}
