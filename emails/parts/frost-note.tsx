import type { ReactNode } from 'react'
import { colors, faces } from './ink.ts'

/** Storage and allergens in the one box they have everywhere: on item, order, receipt and pack slip. */
export function FrostNote(props: { title: string; children: ReactNode }) {
  return (
    <table
      role="presentation"
      width="100%"
      cellPadding="0"
      cellSpacing="0"
      border={0}
      style={{ border: `2px solid ${colors.frost}`, borderRadius: 3, marginTop: 28 }}
    >
      <tbody>
        <tr>
          <td style={{ padding: '14px 16px 12px' }}>
            <h2
              style={{
                color: colors.frost,
                fontFamily: faces.serif,
                fontSize: 20,
                lineHeight: '26px',
                fontWeight: 700,
                margin: 0,
              }}
            >
              {props.title}
            </h2>
            {props.children}
          </td>
        </tr>
      </tbody>
    </table>
  )
}

export function FrostHeading(props: { children: string }) {
  return (
    <h3
      style={{
        color: colors.ink,
        fontFamily: faces.serif,
        fontSize: 17,
        lineHeight: '24px',
        fontWeight: 700,
        margin: '16px 0 4px',
      }}
    >
      {props.children}
    </h3>
  )
}

export function FrostLine(props: { lead?: ReactNode; children: ReactNode }) {
  return (
    <p style={{ fontSize: 16, lineHeight: '24px', margin: '0 0 6px' }}>
      {props.lead !== undefined && <b>{props.lead} </b>}
      {props.children}
    </p>
  )
}
