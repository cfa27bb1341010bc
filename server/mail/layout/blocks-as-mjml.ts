import type { Block } from '@shared/mail/block';
import { escapeMarkup as esc } from './escape-markup';
import { light } from './mail-colours';

type Of<Kind extends Block['kind']> = Extract<Block, { kind: Kind }>;

/** One block as MJML elements of a column. */
export function blockAsMjml(block: Block): string {
  switch (block.kind) {
    case 'heading':
      return `<mj-text padding-top="22px" css-class="ink"><h2 style="margin:0;font-size:18px;line-height:24px;font-weight:600">${esc(block.text)}</h2></mj-text>`;
    case 'paragraph':
      return `<mj-text css-class="ink">${esc(block.text)}</mj-text>`;
    case 'note':
      return `<mj-text font-size="14px" line-height="20px" color="${light('ink2')}" css-class="ink2">${esc(block.text)}</mj-text>`;
    case 'button':
      return `<mj-button href="${esc(block.href)}" background-color="${light('kelp')}" color="${light('onKelp')}" border-radius="8px" align="left" font-size="16px" font-weight="600" inner-padding="12px 22px" padding="12px 24px" css-class="button">${esc(block.label)}</mj-button>`;
    case 'figures':
      return figures(block);
    case 'table':
      return table(block);
    case 'list':
      return list(block);
  }
}

function figures({ figures: all }: Of<'figures'>): string {
  // Blocks in a line, not cells of a table: on a phone they go below each other, and none breaks.
  const cells = all.map(
    ({ value, label, tone }) =>
      `<div style="display:inline-block;vertical-align:top;min-width:84px;max-width:150px;padding:4px 22px 6px 0"><div class="${tone === 'alert' ? 'alert' : 'ink'}" style="font-size:25px;line-height:32px;white-space:nowrap;color:${light(tone === 'alert' ? 'alert' : 'ink')}">${esc(value)}</div><div class="ink2" style="font-size:14px;line-height:18px;color:${light('ink2')}">${esc(label)}</div></div>`,
  );
  return `<mj-text css-class="ink">${cells.join('')}</mj-text>`;
}

function table({ caption, columns, rows }: Of<'table'>): string {
  const align = (index: number) => (columns[index]?.numeric ? 'right' : 'left');
  // Figures stay whole; names may take two lines.
  const unbroken = (index: number) => (columns[index]?.numeric ? 'white-space:nowrap;' : '');
  const head = columns.map(
    ({ label }, index) =>
      `<th scope="col" class="ink2 line" style="text-align:${align(index)};word-break:normal;vertical-align:bottom;padding:4px 5px 4px 0;font-size:13px;font-weight:600;color:${light('ink2')};border-bottom:1px solid ${light('line')}">${esc(label)}</th>`,
  );
  const body = rows.map((row) => {
    const cells = row.map(
      (cell, index) =>
        `<td class="ink line" style="text-align:${align(index)};${unbroken(index)}padding:6px 5px 6px 0;vertical-align:top;border-bottom:1px solid ${light('line')}">${esc(cell)}</td>`,
    );
    return `<tr>${cells.join('')}</tr>`;
  });
  return `<mj-table font-size="14px" line-height="19px" css-class="ink"><caption class="ink2" style="text-align:left;font-size:13px;padding:0 0 4px;color:${light('ink2')}">${esc(caption)}</caption><thead><tr>${head.join('')}</tr></thead><tbody>${body.join('')}</tbody></mj-table>`;
}

function list({ title, lines }: Of<'list'>): string {
  const items = lines.map(({ text, href }) => {
    const words = href
      ? `<a class="link" href="${esc(href)}" style="color:${light('kelp')}">${esc(text)}</a>`
      : esc(text);
    return `<li style="margin:4px 0">${words}</li>`;
  });
  return `<mj-text css-class="ink"><div style="font-weight:600">${esc(title)}</div><ul style="margin:2px 0 0;padding:0 0 0 20px">${items.join('')}</ul></mj-text>`;
}
