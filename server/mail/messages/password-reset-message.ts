import type { Locale } from '@shared/mail/locale';
import type { MailMessage } from '../mail-message';

export interface PasswordResetContent {
  readonly name: string;
  /** Address with the one-time token. */
  readonly link: string;
  /** Until when the link works, in the reader's words and zone. */
  readonly until: string;
}

const words = {
  en: (it: PasswordResetContent) => ({
    subject: 'Choose a new password for Vatwright',
    preview: 'The link works once, and for an hour.',
    greeting: `Hello ${it.name},`,
    body: 'Somebody, probably you, asked for a new password for your account.',
    button: 'Choose a new password',
    note: `The link works once, until ${it.until}. A new password signs you out everywhere else. If you did not ask for it, do nothing: your password stays as it is.`,
  }),
  es: (it: PasswordResetContent) => ({
    subject: 'Elija una contraseña nueva para Vatwright',
    preview: 'El enlace sirve una sola vez y durante una hora.',
    greeting: `Hola, ${it.name}:`,
    body: 'Alguien, probablemente usted, pidió una contraseña nueva para su cuenta.',
    button: 'Elegir una contraseña nueva',
    note: `El enlace sirve una sola vez, hasta el ${it.until}. La contraseña nueva cerrará sus demás sesiones. Si usted no la pidió, no haga nada: su contraseña sigue siendo la misma.`,
  }),
} satisfies Record<Locale, unknown>;

/** Sends the link for a forgotten password. */
export const passwordResetMessage: MailMessage<PasswordResetContent> = {
  kind: 'password-reset',
  sample: {
    name: 'Rosa Delgado',
    link: 'https://vatwright.example/reset-password/example',
    until: 'Fri, Jun 12, 9:00 AM CDT',
  },
  write(content, locale) {
    const { subject, preview, greeting, body, button, note } = words[locale](content);
    return {
      subject,
      preview,
      blocks: [
        { kind: 'paragraph', text: greeting },
        { kind: 'paragraph', text: body },
        { kind: 'button', label: button, href: content.link },
        { kind: 'note', text: note },
      ],
    };
  },
};
