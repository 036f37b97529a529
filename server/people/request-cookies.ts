/** A request's cookie header without some of the sign-in library's cookies, whatever prefix they carry. */
export function withoutCookies(header: string | undefined, names: readonly string[]): string {
  return (header ?? '')
    .split(';')
    .filter(piece => !names.some(name => piece.split('=')[0]?.trim().endsWith(`tallykin.${name}`)))
    .join(';')
}
