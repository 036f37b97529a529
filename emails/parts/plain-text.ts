/** The text part of a mail, written for reading and not derived from the HTML. Lines are never broken here. */

/** A heading on its own line, underlined. */
export function heading(title: string): string[] {
  return [title, '-'.repeat([...title].length)]
}

/** Blocks with an empty line between them; an empty block leaves no gap. */
export function blocks(...parts: (readonly string[] | string)[]): string {
  const written = parts
    .map(part => (typeof part === 'string' ? part : part.join('\n')))
    .filter(part => part !== '')
  return `${written.join('\n\n')}\n`
}

export function indented(lines: readonly string[], by = 2): string[] {
  return lines.map(line => ' '.repeat(by) + line)
}

/** A link on a line of its own, below what it is for. */
export function linkLines(label: string, url: string): string[] {
  return [`${label}:`, url]
}
