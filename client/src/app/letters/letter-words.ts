import type { LetterKind, LetterState } from '@shared/mail/letter-kind';

/** What a letter is about. */
export function kindWord(kind: LetterKind): string {
  switch (kind) {
    case 'invitation':
      return $localize`:@@letters.kind.invitation:Invitation`;
    case 'password-reset':
      return $localize`:@@letters.kind.password-reset:New password`;
    case 'reminders':
      return $localize`:@@letters.kind.reminders:Day’s tasks`;
    case 'digest':
      return $localize`:@@letters.kind.digest:Digest`;
  }
}

export function letterStateWord(state: LetterState): string {
  switch (state) {
    case 'queued':
      return $localize`:@@letters.state.queued:waiting`;
    case 'sent':
      return $localize`:@@letters.state.sent:sent`;
    case 'dead':
      return $localize`:@@letters.state.dead:refused`;
  }
}
