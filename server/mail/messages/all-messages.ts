import type { MailMessage } from '../mail-message';
import { digestMessage } from './digest-message';
import { invitationMessage } from './invitation-message';
import { passwordResetMessage } from './password-reset-message';
import { remindersMessage } from './reminders-message';

/** A kind of letter as its own sample writes it. */
const asSample = <Content>(message: MailMessage<Content>) => ({
  kind: message.kind,
  write: (locale: 'en' | 'es') => message.write(message.sample, locale),
});

/** Every kind of letter with its sample, to be looked at and to be held to what all must keep. */
export const sampleMessages = [
  asSample(invitationMessage),
  asSample(passwordResetMessage),
  asSample(remindersMessage),
  asSample(digestMessage),
];
