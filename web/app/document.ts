import type { Head } from './head.ts'

type DocumentParts = {
  html: string
  head: Partial<Head> & { title: string }
  /** Style sheet put into the page itself, so that the first response is enough to draw it. */
  css: string
  styles: string[]
  scripts: string[]
  preloads: string[]
  nonce: string
  state: unknown
  locale: string
  publicUrl: string
}

/** The whole document around a page. */
export function document(parts: DocumentParts): string {
  const { head, nonce } = parts
  const isCustomerPage = parts.css !== '' || parts.state !== null
  const meta = [
    '<meta charset="utf-8">',
    '<meta name="viewport" content="width=device-width, initial-scale=1">',
    `<title>${escapeHtml(head.title)}</title>`,
    head.description ? `<meta name="description" content="${escapeHtml(head.description)}">` : '',
    '<meta name="robots" content="noindex, nofollow">',
    '<meta name="color-scheme" content="light dark">',
    '<meta name="theme-color" content="#e6edf4">',
    '<link rel="icon" href="data:,">',
    ...(head.preview
      ? [
          '<meta property="og:type" content="website">',
          '<meta property="og:site_name" content="Tallykin">',
          `<meta property="og:title" content="${escapeHtml(head.title)}">`,
          `<meta property="og:description" content="${escapeHtml(head.description ?? '')}">`,
        ]
      : []),
    ...parts.preloads.map(
      font => `<link rel="preload" href="${font}" as="font" type="font/woff2" crossorigin>`,
    ),
    parts.css ? `<style nonce="${nonce}">${parts.css}</style>` : '',
    ...parts.styles.map(href => `<link rel="stylesheet" href="${href}">`),
    ...parts.scripts.map(src => `<script type="module" nonce="${nonce}" src="${src}"></script>`),
  ]
  const state =
    parts.state === null
      ? ''
      : `<script type="application/json" id="state" nonce="${nonce}">${JSON.stringify(parts.state).replaceAll('<', '\\u003c')}</script>`
  return `<!doctype html><html lang="${parts.locale}"><head>${meta.filter(Boolean).join('')}</head><body${isCustomerPage ? ' class="store"' : ''}><div id="root">${parts.html}</div>${state}</body></html>`
}

function escapeHtml(text: string): string {
  return text
    .replaceAll('&', '&amp;')
    .replaceAll('<', '&lt;')
    .replaceAll('>', '&gt;')
    .replaceAll('"', '&quot;')
}
