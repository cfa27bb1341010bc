import type { Locale } from '@shared/mail/locale';
import type { MailMessage } from '../mail-message';

export interface InvitationContent {
  readonly name: string;
  readonly invitedBy: string;
  readonly organisation: string;
  /** Address with the one-time token. */
  readonly link: string;
  /** Until when the link works, in the reader's words and zone. */
  readonly until: string;
}

const words = {
  en: (it: InvitationContent) => ({
    subject: `${it.invitedBy} invites you to ${it.organisation} on Vatwright`,
    preview: 'Choose a password and you are in.',
    greeting: `Hello ${it.name},`,
    body: `${it.invitedBy} has made an account for you at ${it.organisation}. In Vatwright you see which oil filtration checks are due, and record what was done.`,
    button: 'Choose a password',
    note: `The link works once, until ${it.until}. If you were not expecting this, do nothing: without a password the account cannot be used.`,
  }),
  es: (it: InvitationContent) => ({
    subject: `${it.invitedBy} le invita a ${it.organisation} en Vatwright`,
    preview: 'Elija una contraseña y podrá entrar.',
    greeting: `Hola, ${it.name}:`,
    body: `${it.invitedBy} le ha creado una cuenta en ${it.organisation}. En Vatwright verá qué revisiones de la filtración de aceite tocan y podrá registrar lo que se hizo.`,
    button: 'Elegir una contraseña',
    note: `El enlace sirve una sola vez, hasta el ${it.until}. Si no esperaba este mensaje, no haga nada: sin contraseña la cuenta no se puede usar.`,
  }),
} satisfies Record<Locale, unknown>;

/** Asks a new person to choose a password. */
export const invitationMessage: MailMessage<InvitationContent> = {
  kind: 'invitation',
  sample: {
    name: 'Rosa Delgado',
    invitedBy: 'Ann Whitlock',
    organisation: 'Kettle & Flue',
    link: 'https://vatwright.example/invitation/example',
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
