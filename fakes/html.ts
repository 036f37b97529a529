/** Markup that may be written out as it is. Everything else put into `html` is escaped. */
export class Markup {
  readonly text: string
  constructor(text: string) {
    this.text = text
  }
  toString(): string {
    return this.text
  }
}

type Piece = string | number | Markup | null | undefined | false | Piece[]

const NAMED: Record<string, string> = { '&': '&amp;', '<': '&lt;', '>': '&gt;', '"': '&quot;', "'": '&#39;' }

export function escapeHtml(text: string): string {
  return text.replace(/[&<>"']/g, found => NAMED[found]!)
}

/** A template tag for HTML: values are escaped unless they are markup themselves; null, undefined and false vanish. */
export function html(parts: TemplateStringsArray, ...pieces: Piece[]): Markup {
  let text = parts[0]!
  pieces.forEach((piece, at) => {
    text += written(piece) + parts[at + 1]!
  })
  return new Markup(text)
}

function written(piece: Piece): string {
  if (piece === null || piece === undefined || piece === false) return ''
  if (Array.isArray(piece)) return piece.map(written).join('')
  return piece instanceof Markup ? piece.text : escapeHtml(String(piece))
}
