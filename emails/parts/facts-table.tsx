import type { ReactNode } from 'react'
import { colors } from './ink.ts'

export type FactRow = { name: string; value: ReactNode; note?: ReactNode }

/** Facts on ruled lines: the name of each, and the fact. */
export function FactsTable(props: { rows: readonly FactRow[] }) {
  return (
    <table width="100%" cellPadding="0" cellSpacing="0" border={0} style={{ marginTop: 14 }}>
      <tbody>
        {props.rows.map(row => (
          <tr key={row.name}>
            <th
              scope="row"
              align="left"
              style={{
                borderBottom: `1px solid ${colors.rule}`,
                color: colors.inkSoft,
                fontSize: 15,
                fontWeight: 600,
                lineHeight: '26px',
                padding: '9px 10px 9px 0',
                textAlign: 'left',
                verticalAlign: 'top',
                width: 104,
              }}
            >
              {row.name}
            </th>
            <td
              style={{
                borderBottom: `1px solid ${colors.rule}`,
                color: colors.ink,
                fontSize: 17,
                fontWeight: 600,
                lineHeight: '26px',
                padding: '9px 0',
                verticalAlign: 'top',
              }}
            >
              {row.value}
              {row.note !== undefined && (
                <div style={{ fontSize: 15, fontWeight: 400, lineHeight: '22px' }}>{row.note}</div>
              )}
            </td>
          </tr>
        ))}
      </tbody>
    </table>
  )
}
