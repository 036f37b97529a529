import { colors } from './ink.ts'

/** The perforation, where a sheet is torn off: a dashed line between two notches. */
export function Perforation() {
  const notch = (radius: string) => (
    <td
      width="10"
      style={{ backgroundColor: colors.desk, borderRadius: radius, fontSize: 1, height: 20, width: 10 }}
    >
      {'\u00a0'}
    </td>
  )
  return (
    <table
      role="presentation"
      aria-hidden="true"
      width="100%"
      cellPadding="0"
      cellSpacing="0"
      border={0}
      style={{ margin: '26px 0 6px' }}
    >
      <tbody>
        <tr>
          {notch('0 10px 10px 0')}
          <td style={{ verticalAlign: 'middle' }}>
            <div
              style={{ borderTop: `2px dashed ${colors.field}`, fontSize: 1, height: 1, lineHeight: '1px' }}
            >
              {'\u00a0'}
            </div>
          </td>
          {notch('10px 0 0 10px')}
        </tr>
      </tbody>
    </table>
  )
}
