import type { Block } from './blocks.js';

const WIDTH = 72;

/** Breaks at spaces; a word longer than the line, such as a link, stays whole. */
export function wrap(text: string, width = WIDTH): string {
  const lines: string[] = [];
  let line = '';
  for (const word of text.split(/\s+/).filter(Boolean)) {
    if (line && line.length + 1 + word.length > width) {
      lines.push(line);
      line = word;
    } else {
      line = line ? `${line} ${word}` : word;
    }
  }
  return [...lines, line].join('\n');
}

/** The plain part of a mail. */
export function asText(blocks: readonly Block[], footer: string): string {
  return `${[...blocks.map(blockAsText), `-- \n${wrap(footer)}`].join('\n\n')}\n`;
}

function blockAsText(block: Block): string {
  switch (block.kind) {
    case 'heading':
      return `${wrap(block.text)}\n${'='.repeat(Math.min(block.text.length, WIDTH))}`;
    case 'paragraph':
      return wrap(block.text);
    case 'note':
      return wrap(`Note: ${block.text}`);
    case 'link':
      return `${block.label}:\n${block.url}`;
    case 'table':
      return tableAsText(block);
  }
}

function tableAsText({ columns, rows }: Extract<Block, { kind: 'table' }>): string {
  const lines = [columns.map((column) => column.title), ...rows];
  const widths = columns.map((_, index) => Math.max(...lines.map((cells) => cells[index]?.length ?? 0)));
  return lines
    .map((cells) =>
      columns
        .map((column, index) => (column.numeric ? (cells[index] ?? '').padStart(widths[index]!) : (cells[index] ?? '').padEnd(widths[index]!)))
        .join('  ')
        .trimEnd(),
    )
    .join('\n');
}
