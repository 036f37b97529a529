import type { ReactNode } from 'react'
import { colors, faces } from './ink.ts'

/** A padded part of the sheet; what stands outside one reaches from edge to edge. */
export function Part(props: { children: ReactNode }) {
  return (
    <table role="presentation" width="100%" cellPadding="0" cellSpacing="0" border={0}>
      <tbody>
        <tr>
          <td className="part" style={{ padding: '0 20px' }}>
            {props.children}
          </td>
        </tr>
      </tbody>
    </table>
  )
}

export function Title(props: { children: ReactNode }) {
  return (
    <h1
      className="h1"
      style={{
        fontFamily: faces.serif,
        fontSize: 26,
        lineHeight: '32px',
        fontWeight: 700,
        margin: '26px 0 10px',
      }}
    >
      {props.children}
    </h1>
  )
}

/** A heading over the double rule of a printed form. */
export function Subtitle(props: { children: ReactNode }) {
  return (
    <h2
      style={{
        fontFamily: faces.serif,
        fontSize: 20,
        lineHeight: '26px',
        fontWeight: 700,
        margin: '30px 0 0',
        paddingBottom: 7,
        borderBottom: `3px double ${colors.ink}`,
      }}
    >
      {props.children}
    </h2>
  )
}

export function Para(props: { children: ReactNode }) {
  return <p style={{ fontSize: 17, lineHeight: '26px', margin: '0 0 12px' }}>{props.children}</p>
}

export function Small(props: { children: ReactNode }) {
  return (
    <p style={{ color: colors.inkSoft, fontSize: 15, lineHeight: '23px', margin: '0 0 16px' }}>
      {props.children}
    </p>
  )
}

/** Something a person typed, set apart from the direction of the text around it. */
export function Typed(props: { children: string }) {
  return <bdi>{props.children}</bdi>
}

/** A word as from a rubber stamp. Decoration: the fact stands beside it in plain text. */
export function Stamp(props: { children: string }) {
  return (
    <span
      aria-hidden="true"
      style={{
        border: `3px solid ${colors.paid}`,
        borderRadius: 4,
        color: colors.paid,
        display: 'inline-block',
        fontFamily: faces.serif,
        fontSize: 16,
        fontWeight: 800,
        letterSpacing: 1,
        lineHeight: '18px',
        margin: '0 4px 0 8px',
        padding: '2px 9px',
        textTransform: 'uppercase',
        transform: 'rotate(-5deg)',
      }}
    >
      {props.children}
    </span>
  )
}

/** A code in boxed letters, as on a form, so that none is misread. */
export function BoxedLetters(props: { children: string }) {
  const letters = [...props.children]
  return (
    <span style={{ fontFamily: faces.mono, fontSize: 17, fontWeight: 700, whiteSpace: 'nowrap' }}>
      {letters.map((letter, place) => (
        <span
          key={place}
          style={
            letter === '-'
              ? { padding: '0 3px' }
              : {
                  border: `1px solid ${colors.ink}`,
                  // Neighbors share a side.
                  borderLeft: place > 0 && letters[place - 1] !== '-' ? 'none' : `1px solid ${colors.ink}`,
                  display: 'inline-block',
                  lineHeight: '26px',
                  textAlign: 'center',
                  width: 21,
                }
          }
        >
          {letter}
        </span>
      ))}
    </span>
  )
}
