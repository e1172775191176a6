/** Body cells of the first table below a heading. Throws where there is none: a rule without its table checks nothing. */
export function tableBelow(markdown: string, heading: string): string[][] {
  const lines = markdown.split('\n');
  const start = lines.findIndex((line) => /^#+ /.test(line) && line.replace(/^#+ /, '').trim() === heading);
  if (start < 0) throw new Error(`No heading "${heading}".`);
  const rest = lines.slice(start + 1);
  const end = rest.findIndex((line) => /^#+ /.test(line));
  const section = end < 0 ? rest : rest.slice(0, end);
  const first = section.findIndex((line) => line.startsWith('|'));
  if (first < 0) throw new Error(`No table below "${heading}".`);
  const past = section.slice(first).findIndex((line) => !line.startsWith('|'));
  const table = section.slice(first, past < 0 ? undefined : first + past);
  return table.slice(2).map((line) =>
    line
      .slice(1, line.lastIndexOf('|'))
      .split('|')
      .map((cell) => cell.trim()),
  );
}

/** What stands between single backticks. */
export function inlineCode(text: string): string[] {
  return [...text.matchAll(/`([^`]+)`/g)].map((match) => match[1] ?? '');
}

/** Lines of all fenced blocks. */
export function fencedLines(markdown: string): string[] {
  return [...markdown.matchAll(/^```[^\n]*\n(.*?)^```/gms)].flatMap((match) => (match[1] ?? '').split('\n'));
}

export function withoutFences(markdown: string): string {
  return markdown.replace(/^```[^\n]*\n.*?^```/gms, '');
}
