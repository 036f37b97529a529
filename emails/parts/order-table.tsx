import type { ReactNode } from 'react'
import { colors, faces } from './ink.ts'

export type OrderRow = { code?: string; name: string; note?: ReactNode; amount: string }
export type SumRow = { name: string; amount: string }

const line = { borderBottom: `1px solid ${colors.rule}`, verticalAlign: 'top' } as const
const head = {
  ...line,
  color: colors.inkSoft,
  fontSize: 14,
  fontWeight: 600,
  lineHeight: '20px',
  padding: '6px 0',
} as const
const amountCell = {
  verticalAlign: 'top',
  fontFamily: faces.mono,
  paddingLeft: 12,
  textAlign: 'right',
  whiteSpace: 'nowrap',
} as const

/** The form as it was filled in: a ruled line per item, the sums below, the total in the large figure. */
export function OrderTable(props: {
  columns: [item: string, amount: string]
  rows: readonly OrderRow[]
  sums?: readonly SumRow[]
  total?: SumRow
}) {
  return (
    <table width="100%" cellPadding="0" cellSpacing="0" border={0}>
      <thead>
        <tr>
          <th scope="col" align="left" style={{ ...head, textAlign: 'left' }}>
            {props.columns[0]}
          </th>
          <th
            scope="col"
            align="right"
            style={{ ...head, textAlign: 'right', paddingLeft: 12, whiteSpace: 'nowrap' }}
          >
            {props.columns[1]}
          </th>
        </tr>
      </thead>
      <tbody>
        {props.rows.map((row, place) => (
          <tr key={place}>
            <td style={{ ...line, padding: '9px 0' }}>
              {row.code !== undefined && <ItemCode code={row.code} />}
              <bdi>{row.name}</bdi>
              {row.note !== undefined && (
                <div style={{ color: colors.inkSoft, fontSize: 15, lineHeight: '22px' }}>{row.note}</div>
              )}
            </td>
            <td align="right" style={{ ...line, ...amountCell, paddingTop: 9 }}>
              {row.amount}
            </td>
          </tr>
        ))}
      </tbody>
      {props.total !== undefined && (
        <tbody>
          {props.sums?.map((sum, place, sums) => {
            const padding = {
              paddingTop: place === 0 ? 11 : 2,
              paddingBottom: place === sums.length - 1 ? 10 : 0,
            }
            return (
              <tr key={sum.name}>
                <td style={padding}>{sum.name}</td>
                <td align="right" style={{ ...amountCell, ...padding }}>
                  {sum.amount}
                </td>
              </tr>
            )
          })}
          <TotalRow {...props.total} />
        </tbody>
      )}
    </table>
  )
}

function TotalRow(props: SumRow) {
  const figure = {
    borderTop: `2px solid ${colors.ink}`,
    fontFamily: faces.serif,
    fontSize: 24,
    fontWeight: 700,
    lineHeight: '32px',
    paddingTop: 10,
  } as const
  return (
    <tr>
      <td style={figure}>{props.name}</td>
      <td align="right" style={{ ...figure, paddingLeft: 12, whiteSpace: 'nowrap' }}>
        {props.amount}
      </td>
    </tr>
  )
}

/** Four digits in a box. */
export function ItemCode(props: { code: string }) {
  return (
    <>
      <span
        style={{
          border: `1px solid ${colors.ink}`,
          fontFamily: faces.mono,
          fontSize: 15,
          letterSpacing: 3,
          padding: '0 1px 0 4px',
        }}
      >
        {props.code}
      </span>{' '}
    </>
  )
}
