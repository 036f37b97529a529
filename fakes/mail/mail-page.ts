import { escapeHtml, html, Markup } from '../html.ts'
import { PAGE_STYLE } from '../page-style.ts'
import type { Message, MessageLine, Note } from './mailbox.ts'

/** How many letters the list on the page holds; all of them are at `/messages`. */
export const SHOWN = 200

/** The catcher as a mail program: the list, and beside it (on a phone, instead of it) one letter. */
export function mailPage(page: {
  nonce: string
  lines: MessageLine[]
  count: number
  notes: Note[]
  message: Message | null
  asText: boolean
}): string {
  const { message } = page
  const count = page.count === 1 ? '1 letter' : `${page.count} letters`
  // The letter's subject is the page's heading once one is open.
  const heading = message ? html`<h2 id="all">${count}</h2>` : html`<h1 id="all">${count}</h1>`
  const title = message ? `${message.subject || 'No subject'} · Mail catcher` : 'Mail catcher'
  return `<!doctype html>${html`<html lang="en">
    <head>
      <meta charset="utf-8">
      <meta name="viewport" content="width=device-width, initial-scale=1">
      <title>${title}</title>
      <link rel="icon" href="data:,">
      <style nonce="${page.nonce}">${new Markup(PAGE_STYLE + STYLE)}</style>
    </head>
    <body class="${message ? 'reading' : 'listing'}">
      <header class="notice"><p><strong>Mail catcher.</strong>
        This stands in for everybody’s mailbox: letters are kept here and go no further.</p></header>
      <main class="rooms">
        <section class="list" aria-labelledby="all">
          <header>
            ${heading}
            <a href="/">Look for new mail</a>
          </header>
          ${page.notes.map(noteOf)}
          ${page.lines.length === 0 && html`<p class="empty soft">Nothing yet. A letter shows up here as soon as it is sent.</p>`}
          <ol>${page.lines.map(
            line => html`<li>
              <a href="/?message=${line.id}" ${line.id === message?.id && html`aria-current="true"`}>
                <span class="subject">${line.subject || 'No subject'}</span>
                <span class="soft">To ${line.to}</span>
                <time class="soft" datetime="${line.date}">${shortDate(line.date)}</time>
              </a>
            </li>`,
          )}</ol>
          ${page.count > SHOWN && html`<p class="soft empty">The newest ${SHOWN} are shown.</p>`}
        </section>
        <div class="desk">${message ? letterOf(message, page.asText) : html`<p class="soft choose">Choose a letter to read it.</p>`}</div>
      </main>
    </body>
  </html>`}`
}

function noteOf(note: Note): Markup {
  return html`<details class="note">
    <summary>${note.title}</summary>
    <dl>${note.rows.map(row => html`<div><dt>${row.label}</dt><dd>${linked(row.value)}</dd></div>`)}</dl>
  </details>`
}

function letterOf(message: Message, asText: boolean): Markup {
  const showText = asText || message.html === ''
  const tab = (label: string, href: string, isCurrent: boolean) =>
    html`<a href="${href}" ${isCurrent && html`aria-current="page"`}>${label}</a>`
  return html`<article class="sheet">
    <p class="back"><a href="/">All letters</a></p>
    <h1>${message.subject || 'No subject'}</h1>
    <dl class="facts">
      <dt>From</dt><dd>${message.from}</dd>
      <dt>To</dt><dd>${message.to}</dd>
      <dt>Arrived</dt><dd><time datetime="${message.date}">${longDate(message.date)}</time></dd>
      ${
        message.attachments.length > 0 &&
        html`<dt>With it</dt><dd>${message.attachments.map(part => `${part.name} (${part.type})`).join(', ')}</dd>`
      }
    </dl>
    <nav class="tabs" aria-label="Parts of the letter">
      ${message.html !== '' && tab('Letter', `/?message=${message.id}`, !showText)}
      ${tab('Text part', `/?message=${message.id}&part=text`, showText)}
    </nav>
    ${
      showText
        ? html`<pre tabindex="0" aria-label="Text part">${linked(message.text)}</pre>`
        : html`<iframe title="Letter: ${message.subject}" src="/messages/${message.id}/html"
            sandbox="allow-popups allow-popups-to-escape-sandbox"></iframe>`
    }
  </article>`
}

/** The letter's own HTML for the frame: links open in a new tab, wherever the letter says they go. */
export function framedLetter(letter: string): string {
  const base = '<base target="_blank">'
  return /<head[^>]*>/i.test(letter) ? letter.replace(/<head[^>]*>/i, head => head + base) : base + letter
}

/** Plain text with its web addresses made into links. */
function linked(text: string): Markup {
  const pieces = text.split(/(https?:\/\/[^\s<>"')\]]+)/)
  const markup = pieces.map((piece, at) => {
    const safe = escapeHtml(piece)
    return at % 2 === 1 ? `<a href="${safe}" target="_blank" rel="noopener">${safe}</a>` : safe
  })
  return new Markup(markup.join(''))
}

const SHORT = new Intl.DateTimeFormat('en-US', { dateStyle: 'medium', timeStyle: 'short', timeZone: 'UTC' })
const LONG = new Intl.DateTimeFormat('en-US', { dateStyle: 'full', timeStyle: 'short', timeZone: 'UTC' })
const shortDate = (iso: string) => SHORT.format(new Date(iso))
const longDate = (iso: string) => `${LONG.format(new Date(iso))} (UTC)`

const STYLE = `
.rooms { max-width: 90rem; margin: 0 auto; }
.list > header { display: flex; justify-content: space-between; align-items: baseline; gap: 1rem; padding: 1.1rem 1.25rem .8rem; }
#all { font-size: 1.25rem; }
.list ol { list-style: none; background: var(--sheet); border-top: 1px solid var(--rule); }
.list li { border-bottom: 1px solid var(--rule); }
.list li a { display: grid; padding: .8rem 1.25rem; text-decoration: none; }
.list li a:hover { background: #f3f6fa; }
.list li a:focus-visible { outline-offset: -3px; }
.list .subject { font-weight: 600; }
.list [aria-current] { box-shadow: inset 4px 0 var(--ink); background: #f3f6fa; }
.empty, .choose { padding: 1rem 1.25rem; }
.note { background: var(--sheet); border-top: 1px solid var(--rule); font-size: .9375rem; }
.note summary { cursor: pointer; padding: .8rem 1.25rem; font-weight: 600; }
.note dl { padding: 0 1.25rem 1rem; }
.note dl div { padding: .4rem 0; border-top: 1px solid var(--rule); }
.note dt { color: var(--soft); }
article { display: flex; flex-direction: column; min-height: 80vh; }
article h1 { font-size: 1.5rem; padding: .25rem 1.25rem .75rem; font-weight: 650; }
.back { padding: .9rem 1.25rem .4rem; }
.back a, .list header a { display: inline-block; padding: .35rem 0; }
.facts { display: grid; grid-template-columns: auto 1fr; gap: .15rem 1rem; padding: 0 1.25rem 1rem; font-size: .9375rem; }
.facts dt { color: var(--soft); }
.tabs { display: flex; gap: .25rem; padding: 0 1.25rem; border-bottom: 1px solid var(--rule); }
.tabs a { padding: .65rem .9rem; text-decoration: none; border-bottom: 3px solid transparent; }
.tabs a:hover { background: #f3f6fa; }
.tabs [aria-current] { border-color: var(--ink); font-weight: 600; }
iframe { flex: 1; width: 100%; min-height: 75vh; border: 0; background: #fff; }
pre { flex: 1; margin: 0; padding: 1.25rem; white-space: pre-wrap; font: .9375rem/1.55 ui-monospace, 'DejaVu Sans Mono', monospace; }
@media (max-width: 55.99rem) {
  .reading .list, .listing .desk { display: none; }
  .sheet { border-width: 0 0 1px; }
}
@media (min-width: 56rem) {
  body { height: 100vh; display: flex; flex-direction: column; }
  .rooms { flex: 1; min-height: 0; width: 100%; display: grid; grid-template-columns: 24rem 1fr; }
  .list { overflow-y: auto; border-right: 1px solid var(--rule); }
  .desk { overflow-y: auto; padding: 1.5rem; display: grid; }
  .back { display: none; }
  article { min-height: 0; }
  article h1 { padding-top: 1.25rem; font-size: 1.75rem; }
  iframe { min-height: 20rem; }
  .choose { place-self: center; }
}
`
