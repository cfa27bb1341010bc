import type { Block } from '@shared/mail/block';
import type { LetterKind } from '@shared/mail/letter-kind';
import type { Locale } from '@shared/mail/locale';

/** A letter in words, before it has a form. */
export interface WrittenMessage {
  readonly subject: string;
  /** The line that mail programs show beside the subject. */
  readonly preview: string;
  readonly blocks: readonly Block[];
}

/** One kind of letter: how it reads in each language, with an example to look at. */
export interface MailMessage<Content> {
  readonly kind: LetterKind;
  readonly sample: Content;
  write(content: Content, locale: Locale): WrittenMessage;
}
