import { Link } from '@react-email/components'
import { colors, faces } from './ink.ts'

/**
 * The one thing to do; `quiet` for what is seldom needed. The button is a cell with a link in it, so that it is
 * one where borders and padding of links are not drawn.
 */
export function Action(props: { href: string; children: string; quiet?: boolean }) {
  const cell = props.quiet
    ? { border: `2px solid ${colors.field}`, borderRadius: 3 }
    : { backgroundColor: colors.ink, border: `2px solid ${colors.ink}`, borderRadius: 3 }
  return (
    <table
      role="presentation"
      cellPadding="0"
      cellSpacing="0"
      border={0}
      style={{ margin: '18px 0 16px', maxWidth: '100%' }}
    >
      <tbody>
        <tr>
          <td style={cell}>
            <Link
              href={webAddress(props.href)}
              style={{
                color: props.quiet ? colors.ink : '#FFFFFF',
                display: 'inline-block',
                fontFamily: faces.serif,
                fontSize: props.quiet ? 17 : 18,
                fontWeight: 700,
                lineHeight: '24px',
                padding: '11px 24px',
                textDecoration: 'none',
              }}
            >
              {props.children}
            </Link>
          </td>
        </tr>
      </tbody>
    </table>
  )
}

/** The address itself, for whoever cannot or will not press a button. */
export function PlainLink(props: { href: string }) {
  return (
    <Link
      href={webAddress(props.href)}
      style={{ color: colors.ink, textDecoration: 'underline', wordBreak: 'break-all' }}
    >
      {props.href}
    </Link>
  )
}

export function MailLink(props: { email: string }) {
  return (
    <Link
      href={`mailto:${encodeURIComponent(props.email).replace('%40', '@')}`}
      style={{ color: colors.ink, textDecoration: 'underline', wordBreak: 'break-all' }}
    >
      {props.email}
    </Link>
  )
}

/** @throws for an address that is not http(s): a mistake of ours, which must stop the mail and not be clicked. */
function webAddress(href: string): string {
  const { protocol } = new URL(href)
  if (protocol !== 'https:' && protocol !== 'http:') throw new TypeError('a mail links to web addresses only')
  return href
}
