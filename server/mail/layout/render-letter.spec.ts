import { letterKinds } from '@shared/mail/letter-kind';
import { locales } from '@shared/mail/locale';
import { sampleMessages } from '../messages/all-messages';
import { renderLetter } from './render-letter';

describe('rendering letters', () => {
  it('has a sample of every kind', () => {
    expect(sampleMessages.map(({ kind }) => kind).sort()).toEqual([...letterKinds].sort());
  });

  for (const { kind, write } of sampleMessages) {
    for (const locale of locales) {
      it(`gives a ${kind} letter in ${locale} two parts that load nothing from anywhere`, async () => {
        const message = write(locale);
        const { subject, html, plain } = await renderLetter(message, locale);
        expect(subject).toBe(message.subject);
        expect(html).toContain(`lang="${locale}"`);
        expect(html).not.toMatch(/<(script|img|link|iframe|form)\b|@import|url\(/i);
        expect(html).not.toMatch(/undefined|\[object|NaN/);
        expect(plain).not.toMatch(/undefined|\[object|NaN|<\w/);
        for (const block of message.blocks) {
          if (block.kind === 'button') expect(plain).toContain(block.href);
        }
      });
    }
  }

  it('shows names as they are, whatever is in them', async () => {
    const nasty = `<img src=x onerror=alert(1)> & "Co" {{7*7}}`;
    const { html, plain, subject } = await renderLetter(
      {
        subject: `News\r\nBcc: everybody@example.org`,
        preview: nasty,
        blocks: [
          { kind: 'paragraph', text: nasty },
          { kind: 'list', title: nasty, lines: [{ text: nasty, href: `https://x.example/"><b>` }] },
          {
            kind: 'table',
            caption: nasty,
            columns: [{ label: nasty, numeric: false }],
            rows: [[nasty]],
          },
          { kind: 'figures', figures: [{ value: nasty, label: nasty, tone: 'alert' }] },
        ],
      },
      'en',
    );
    expect(html).not.toContain('<img');
    expect(html).not.toContain('"><b>');
    expect(html.match(/&lt;img src=x onerror=alert\(1\)&gt;/g)?.length).toBeGreaterThan(5);
    expect(plain).toContain(nasty);
    expect(subject).toBe('News Bcc: everybody@example.org');
  });
});
