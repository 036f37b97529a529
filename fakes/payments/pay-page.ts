import type Stripe from 'stripe'
import { html, Markup } from '../html.ts'
import { PAGE_STYLE } from '../page-style.ts'
import { type Field, type FieldProblem, type Language, TEXTS } from './pay-texts.ts'

export type Typed = Record<Field, string>
export type Problems = Partial<Record<Field | 'whole', FieldProblem>>

type PageParts = { language: Language; nonce: string; title: string; body: Markup }

/** The form where a card is typed. Works without a script; after a refusal it comes back as it was filled in. */
export function cardFormPage(page: {
  session: Stripe.Checkout.Session
  lines: Stripe.LineItem[]
  language: Language
  nonce: string
  minutesLeft: number
  typed: Typed
  problems: Problems
}): string {
  const { session, language, typed, problems } = page
  const texts = TEXTS[language]
  const money = moneyIn(language, session.currency ?? 'usd')
  const total = money(session.amount_total ?? 0)
  const fields: Field[] = ['number', 'expiry', 'code', 'name']
  const refused = fields.filter(field => problems[field])
  const hasProblem = refused.length > 0 || problems.whole !== undefined

  const input = (field: Field, attributes: Markup) => {
    const problem = problems[field]
    const hint = field === 'name' ? null : texts.hints[field]
    const described = [problem && `${field}-problem`, hint && `${field}-hint`].filter(Boolean).join(' ')
    return html`<div class="field ${field}">
      <label for="${field}">${texts.labels[field]}</label>
      <input id="${field}" name="${field}" value="${typed[field]}" autocomplete="off" spellcheck="false" ${attributes}
        ${described && html`aria-describedby="${described}"`} ${problem && html`aria-invalid="true"`}
        ${refused[0] === field && html`autofocus`}>
      ${problem && html`<p class="problem" id="${field}-problem">${texts.problems[problem]}</p>`}
      ${hint && html`<p class="soft" id="${field}-hint">${hint}</p>`}
    </div>`
  }

  const body = html`<main class="pay"><div class="sheet">
    <div class="due">
      <h1><span>${texts.due}</span> <span class="amount">${total}</span></h1>
      <p class="soft">${texts.closesIn(page.minutesLeft)}</p>
    </div>
    <form method="post" novalidate>
      ${
        problems.whole &&
        html`<div class="problem whole" role="alert" tabindex="-1" autofocus>
          <strong>${texts.problemHeading}</strong><br>${texts.problems[problems.whole]}
        </div>`
      }
      ${input('number', html`inputmode="numeric" maxlength="23" required`)}
      ${input('expiry', html`inputmode="numeric" maxlength="7" required`)}
      ${input('code', html`inputmode="numeric" maxlength="4" required`)}
      ${input('name', html`maxlength="120" required`)}
      <button type="submit">${texts.pay(total)}</button>
      ${session.cancel_url && html`<p class="back"><a href="${session.cancel_url}">${texts.back}</a></p>`}
    </form>
    <section class="lines" aria-labelledby="lines">
      <h2 id="lines">${texts.order}</h2>
      <ul>${page.lines.map(
        line =>
          html`<li><span>${line.quantity} × ${line.description}</span> <span class="amount">${money(line.amount_total)}</span></li>`,
      )}
        <li class="total"><span>${texts.total}</span> <span>${total}</span></li>
      </ul>
      <details>
        <summary>${texts.numbers}</summary>
        <ul>${texts.outcomes.map(
          ({ number, outcome }) =>
            html`<li><span class="number">${number}</span> <span>${outcome}</span></li>`,
        )}</ul>
      </details>
    </section>
  </div></main>`
  const title = hasProblem ? `${texts.errorTitle}: ${texts.pay(total)}` : texts.pay(total)
  return pageOf({ language, nonce: page.nonce, title, body })
}

/** Said instead of the form when there is nothing to pay here. */
export function closedPage(page: {
  kind: 'paid' | 'expired' | 'unknown'
  language: Language
  nonce: string
  linkTo: string | null
}): string {
  const texts = TEXTS[page.language]
  const said = texts[page.kind]
  const body = html`<main class="closed sheet">
    <h1>${said.title}</h1>
    <p>${said.text}</p>
    ${page.linkTo && 'link' in said && html`<p><a href="${page.linkTo}">${said.link}</a></p>`}
  </main>`
  return pageOf({ language: page.language, nonce: page.nonce, title: said.title, body })
}

function pageOf({ language, nonce, title, body }: PageParts): string {
  const texts = TEXTS[language]
  return `<!doctype html>${html`<html lang="${language}">
    <head>
      <meta charset="utf-8">
      <meta name="viewport" content="width=device-width, initial-scale=1">
      <meta name="robots" content="noindex">
      <title>${title} · ${texts.service}</title>
      <link rel="icon" href="data:,">
      <style nonce="${nonce}">${new Markup(PAGE_STYLE + STYLE)}</style>
    </head>
    <body>
      <header class="notice"><p><strong>${texts.notice}</strong> ${texts.noticeMore}</p></header>
      ${body}
    </body>
  </html>`}`
}

/** Cents as a reader of the language writes them, in the United States' way of setting amounts. */
function moneyIn(language: Language, currency: string): (cents: number) => string {
  const format = new Intl.NumberFormat(language === 'es' ? 'es-US' : 'en-US', { style: 'currency', currency })
  return cents => format.format(cents / 100)
}

const STYLE = `
.notice { text-align: center; }
main.pay { max-width: 40rem; margin: 0 auto; padding: 1.5rem 1rem 3rem; }
.due { padding: 1.5rem 1.25rem 1.1rem; border-bottom: 2px solid var(--ink); }
h1 { display: flex; justify-content: space-between; align-items: baseline; gap: 1rem; font-weight: 600; }
h1 span { font-size: 1.25rem; }
h1 .amount { font-size: 2.5rem; letter-spacing: -.01em; }
form { padding: 1.25rem; display: grid; gap: 1.1rem 1rem; grid-template-columns: 5fr 7fr; align-items: start; }
.number, .name, form > button, .back, .whole { grid-column: 1 / -1; }
label { display: block; font-size: 1rem; font-weight: 600; margin-bottom: .3rem; }
input { width: 100%; min-height: 3rem; padding: .5rem .75rem; font: inherit; font-size: 1.125rem; color: inherit;
  background: var(--sheet); border: 1px solid var(--field); border-radius: 2px; }
input[aria-invalid] { border: 2px solid var(--alarm); }
.field .soft, .field .problem { margin-top: .35rem; }
.problem { color: var(--alarm); font-weight: 600; font-size: .9375rem; }
.whole { border-left: 4px solid var(--alarm); padding: .35rem .9rem; font-weight: 400; font-size: 1rem; }
button { min-height: 3.25rem; padding: .5rem 1rem; font: inherit; font-size: 1.1875rem; font-weight: 600; color: #fff;
  background: var(--ink); border: 0; border-radius: 2px; cursor: pointer; }
button:hover { background: #0d1840; }
.back a, .closed a { display: inline-block; padding: .6rem 0; }
.lines { padding: 1.25rem; border-top: 2px dashed var(--rule); }
.lines h2 { font-size: 1.0625rem; margin-bottom: .5rem; }
.lines ul { list-style: none; }
.lines li { display: flex; justify-content: space-between; gap: 1rem; padding: .5rem 0; border-top: 1px solid var(--rule); }
.lines li > :last-child { text-align: right; }
.amount, .lines .number { white-space: nowrap; }
.lines .total { border-top: 2px solid var(--ink); font-weight: 600; }
details { margin-top: 1rem; font-size: .9375rem; }
summary { cursor: pointer; padding: .6rem 0; }
.closed { max-width: 34rem; margin: 12vh auto 0; padding: 2rem 1.5rem; display: grid; gap: 1rem; }
.closed h1 { display: block; font-size: 1.75rem; }
@media (max-width: 36rem) { .closed { margin: 1.5rem 1rem 0; } }
@media (max-width: 22rem) { .field { grid-column: 1 / -1; } }
@media (max-width: 30rem) { :lang(es) .field { grid-column: 1 / -1; } }
@media (min-width: 48rem) {
  main.pay { padding-top: 2.5rem; }
  .due, form, .lines { padding-inline: 2.25rem; }
  form { padding-block: 1.75rem; }
}
`
