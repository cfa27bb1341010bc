import { digestBlocks } from '@shared/digests/digest-blocks';
import type { DigestContent } from '@shared/digests/digest-content';
import { digestSample } from '@shared/digests/digest-sample';
import { digestWords } from '@shared/digests/digest-words';
import { formatCount, formatMonth, formatRate } from '@shared/mail/format-moment';
import type { MailMessage } from '../mail-message';

export interface DigestMessageContent {
  readonly digestId: string;
  readonly digest: DigestContent;
  readonly baseUrl: string;
}

/** A letter shows so many stores and counts the rest: past that, the table is for the page. */
const MOST_ROWS = 25;

const words = {
  en: { button: 'Open the digest' },
  es: { button: 'Abrir el resumen' },
} as const;

/** The month of one chain, for those who answer for it. */
export const digestMessage: MailMessage<DigestMessageContent> = {
  kind: 'digest',
  sample: {
    digestId: '3e0f9b1c-52d0-4c6a-9a53-0a4b6c8d2e10',
    digest: digestSample,
    baseUrl: 'https://vatwright.example',
  },
  write({ digestId, digest, baseUrl }, locale) {
    const its = digestWords[locale];
    const month = formatMonth(digest.month, locale);
    return {
      subject: its.subject(digest.chainName, month),
      preview: its.preview(
        formatRate(digest.rate, locale),
        formatCount(digest.overdue.count, locale),
      ),
      blocks: [
        { kind: 'heading', text: its.title(digest.chainName, month) },
        ...digestBlocks({ content: digest, locale, baseUrl, mostRows: MOST_ROWS }),
        { kind: 'button', label: words[locale].button, href: `${baseUrl}/digests/${digestId}` },
      ],
    };
  },
};
