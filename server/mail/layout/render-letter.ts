import mjml from 'mjml';
import type { Locale } from '@shared/mail/locale';
import type { WrittenMessage } from '../mail-message';
import { blockAsMjml } from './blocks-as-mjml';
import { blocksAsText } from './blocks-as-text';
import { escapeMarkup } from './escape-markup';
import { dark, light } from './mail-colours';

/** What goes out: header line and both parts. */
export interface RenderedLetter {
  readonly subject: string;
  readonly html: string;
  readonly plain: string;
}

const footers: Readonly<Record<Locale, string>> = {
  en: 'Sent by Vatwright, because you have work or an account there. Replies to this address are not read.',
  es: 'Enviado por Vatwright porque usted tiene trabajo o una cuenta allí. Nadie lee las respuestas a esta dirección.',
};

const fonts = `'Source Sans 3', 'Segoe UI', Roboto, Helvetica, Arial, sans-serif`;

/**
 * Gives a message its form: one layout for all of them, with a text part that says the same.
 * @throws Error when a block makes markup that MJML does not accept
 */
export async function renderLetter(
  { subject, preview, blocks }: WrittenMessage,
  locale: Locale,
): Promise<RenderedLetter> {
  const { html } = await mjml(
    `<mjml lang="${locale}">
      <mj-head>
        <mj-title>${escapeMarkup(subject)}</mj-title>
        <mj-preview>${escapeMarkup(preview)}</mj-preview>
        <mj-attributes>
          <mj-all font-family="${fonts}" />
          <mj-text font-size="16px" line-height="23px" color="${light('ink')}" padding="6px 24px" />
          <mj-table color="${light('ink')}" padding="6px 24px" />
        </mj-attributes>
        <mj-raw><meta name="color-scheme" content="light dark" /></mj-raw>
        <mj-style>${darkStyle}</mj-style>
      </mj-head>
      <mj-body background-color="${light('surface')}" css-class="surface" width="640px">
        <mj-section padding="16px 0 8px">
          <mj-column><mj-text font-size="20px" font-weight="700" color="${light('kelp')}" css-class="brand">Vatwright</mj-text></mj-column>
        </mj-section>
        <mj-section background-color="${light('card')}" border-radius="10px" padding="12px 0 18px" css-class="card">
          <mj-column>${blocks.map(blockAsMjml).join('')}</mj-column>
        </mj-section>
        <mj-section padding="8px 0 24px">
          <mj-column><mj-text font-size="13px" line-height="18px" color="${light('ink2')}" css-class="ink2">${footers[locale]}</mj-text></mj-column>
        </mj-section>
      </mj-body>
    </mjml>`,
    // No web font: a letter loads nothing from anywhere.
    { validationLevel: 'strict', fonts: {} },
  );
  const plain = `${blocksAsText(blocks)}\n\n-- \n${footers[locale]}\n`;
  return { subject: oneLine(subject), html, plain };
}

/** A subject is one header line, whatever a store or a rule is called. */
function oneLine(text: string): string {
  // eslint-disable-next-line no-control-regex -- control characters are what must not get through
  return text.replace(/[\u0000-\u001f\u007f]+/g, ' ').trim();
}

const darkStyle = `
  @media (prefers-color-scheme: dark) {
    .surface, .surface > div { background: ${dark('surface')} !important; }
    .card, .card > table { background: ${dark('card')} !important; }
    .ink, .ink div, .ink h2, .ink td { color: ${dark('ink')} !important; }
    .ink2, .ink2 div, .ink .ink2 { color: ${dark('ink2')} !important; }
    .line { border-color: ${dark('line')} !important; }
    .brand div, .ink a.link { color: ${dark('kelp')} !important; }
    .alert, .ink .alert { color: ${dark('alert')} !important; }
    .button a, .button td { background: ${dark('kelp')} !important; color: ${dark('onKelp')} !important; }
  }`;
