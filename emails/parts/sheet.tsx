import { Body, Container, Head, Html, Preview } from '@react-email/components'
import type { ReactNode } from 'react'
import type { Locale } from '#shared/wire.ts'
import { colors, faces, type Ply, plies } from './ink.ts'

/** For programs that read a style element: cells keep the face of the sheet, and wide windows get wider margins. */
const STYLE = `
:root { color-scheme: light only; supported-color-schemes: light only; }
td, th, p, a, li { font-family: ${faces.sans}; }
@media (min-width: 600px) {
  .part { padding-left: 36px !important; padding-right: 36px !important; }
  .h1 { font-size: 30px !important; line-height: 36px !important; }
}
`

/** 600 wide where there is room; the attribute is for programs that do not know a greatest width. */
const column = { width: '100%', maxWidth: 600 } as const

/**
 * The sheet every mail is written on: the pad's mark, the band of the reader's ply with its name, the sheet
 * itself and the edges of the plies below, and who sent it.
 */
export function Sheet(props: {
  locale: Locale
  ply: Ply
  subject: string
  preview: string
  /** What this sheet is, and whose. */
  band: string
  bandAside?: string | undefined
  footer: readonly string[]
  children: ReactNode
}) {
  return (
    <Html lang={props.locale} dir="ltr">
      <Head>
        <title>{props.subject}</title>
        <meta name="viewport" content="width=device-width, initial-scale=1" />
        <meta name="color-scheme" content="light only" />
        <meta name="supported-color-schemes" content="light only" />
        {/* biome-ignore lint/security/noDangerouslySetInnerHtml: our own constant, which must not be escaped */}
        <style dangerouslySetInnerHTML={{ __html: STYLE }} />
      </Head>
      <Preview>{props.preview}</Preview>
      <Body
        style={{
          backgroundColor: colors.desk,
          color: colors.ink,
          fontFamily: faces.sans,
          fontSize: 17,
          lineHeight: '26px',
          margin: 0,
          padding: '20px 10px 28px',
          wordBreak: 'break-word',
        }}
      >
        <Masthead />
        <main>
          <Container width="600" style={{ ...column, backgroundColor: colors.sheet }}>
            <Band {...props} />
            {props.children}
            <div style={{ height: 28, lineHeight: '28px' }}>{'\u00a0'}</div>
          </Container>
        </main>
        <PliesBelow ply={props.ply} />
        <footer>
          <Container width="600" style={column}>
            {props.footer.map(sentence => (
              <p
                key={sentence}
                style={{ color: colors.inkSoft, fontSize: 14, lineHeight: '21px', margin: '0 4px 6px' }}
              >
                {sentence}
              </p>
            ))}
          </Container>
        </footer>
      </Body>
    </Html>
  )
}

/** A five-bar gate, its slash in the stamp's red, and the name. */
function Masthead() {
  return (
    <Container width="600" style={column}>
      <header
        style={{
          padding: '0 4px 14px',
          fontFamily: faces.serif,
          fontSize: 22,
          lineHeight: '28px',
          fontWeight: 700,
        }}
      >
        <span
          aria-hidden="true"
          style={{ color: colors.stamp, textDecoration: 'line-through', fontSize: 19 }}
        >
          <span style={{ color: colors.ink, letterSpacing: 2 }}>||||</span>
        </span>
        {'\u00a0 '}Tallykin
      </header>
    </Container>
  )
}

/**
 * The ply's edge, and under it what the sheet is. No text stands on the color itself: programs that turn a mail
 * dark change text and background separately, and light text on goldenrod cannot be read.
 */
function Band(props: { ply: Ply; band: string; bandAside?: string | undefined }) {
  const edge = props.ply === 'white' ? colors.ink : plies[props.ply]
  return (
    <table role="presentation" width="100%" cellPadding="0" cellSpacing="0" border={0}>
      <tbody>
        <tr>
          <td className="part" style={{ borderTop: `12px solid ${edge}`, padding: '0 20px' }}>
            <div
              style={{
                borderBottom: `1px solid ${colors.rule}`,
                lineHeight: '24px',
                padding: '13px 0 11px',
              }}
            >
              <b style={{ fontFamily: faces.serif, fontSize: 18, paddingRight: 12 }}>{props.band}</b>
              {props.bandAside !== undefined && (
                <bdi
                  style={{ color: colors.inkSoft, display: 'inline-block', fontSize: 15, fontWeight: 600 }}
                >
                  {props.bandAside}
                </bdi>
              )}
            </div>
          </td>
        </tr>
      </tbody>
    </table>
  )
}

/** The edges of the pad's other copies, each a little further in. */
function PliesBelow(props: { ply: Ply }) {
  const below = (Object.keys(plies) as Ply[]).filter(ply => ply !== props.ply)
  return (
    <Container width="600" aria-hidden="true" style={{ ...column, marginBottom: 18 }}>
      {below.map((ply, place) => (
        <div
          key={ply}
          style={{
            backgroundColor: plies[ply],
            borderTop: `1px solid ${colors.rule}`,
            height: 5,
            lineHeight: '5px',
            fontSize: 1,
            margin: `0 ${6 * (place + 1)}px`,
          }}
        >
          {'\u00a0'}
        </div>
      ))}
    </Container>
  )
}
