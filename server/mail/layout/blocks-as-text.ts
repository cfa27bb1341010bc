import type { Block } from '@shared/mail/block';

/** Blocks as the plain part of a letter: everything that the other part says, in the same order. */
export function blocksAsText(blocks: readonly Block[]): string {
  return blocks.map(blockAsText).join('\n\n');
}

function blockAsText(block: Block): string {
  switch (block.kind) {
    case 'heading':
      return `${block.text}\n${'-'.repeat(Math.min(block.text.length, 60))}`;
    case 'paragraph':
    case 'note':
      return wrapped(block.text);
    case 'button':
      return `${block.label}:\n${block.href}`;
    case 'figures':
      return block.figures.map(({ value, label }) => `${value}  ${label}`).join('\n');
    case 'table':
      return [`${block.caption}:`, ...block.rows.map((row) => line(row, block.columns))].join('\n');
    case 'list':
      return [
        block.title,
        ...block.lines.map(({ text, href }) => `- ${text}${href ? `\n  ${href}` : ''}`),
      ].join('\n');
  }
}

/** The first cell names the row; the others follow with their column's word. */
function line(row: readonly string[], columns: readonly { readonly label: string }[]): string {
  const [name, ...others] = row;
  const told = others.map((cell, index) => `${columns[index + 1]?.label}: ${cell}`);
  return `- ${[name, ...told].join('; ')}`;
}

/** Lines of at most 76 characters where words allow, as mail programs without wrapping like it. */
function wrapped(text: string): string {
  const lines = [''];
  for (const word of text.split(' ')) {
    const last = lines[lines.length - 1] as string;
    if (last !== '' && last.length + 1 + word.length > 76) lines.push(word);
    else lines[lines.length - 1] = last === '' ? word : `${last} ${word}`;
  }
  return lines.join('\n');
}
