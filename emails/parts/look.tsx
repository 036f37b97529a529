import {
  Body,
  Column,
  Container,
  Head,
  Heading,
  Hr,
  Html,
  Link,
  Preview,
  Row,
  Section,
  Text,
} from '@react-email/components'
import type { ReactNode } from 'react'
import type { Locale } from '#shared/wire.ts'

export const ink = '#16245A'
export const soft = '#4A5780'
const rule = '#B7C5D9'
const frost = '#0A6470'
export const plies = { goldenrod: '#F4B740', pink: '#FFC9D4', canary: '#FFE27A', white: '#FFFFFF' }
const serif = "Besley, 'Besley Variable', Rockwell, Georgia, serif"
const sans = "'Atkinson Hyperlegible Next', 'Atkinson Hyperlegible', Verdana, Geneva, sans-serif"
const mono = "'Atkinson Hyperlegible Mono', Consolas, Menlo, monospace"

/** The sheet every mail is written on: the ply's band on top, the sender named at the foot. */
export function Sheet(props: {
  locale: Locale
  ply: keyof typeof plies
  preview: string
  title: string
  footer: string
  children: ReactNode
}) {
  return (
    <Html lang={props.locale} dir="ltr">
      <Head>
        <title>{props.title}</title>
        <meta name="color-scheme" content="light" />
        <meta name="supported-color-schemes" content="light" />
      </Head>
      <Preview>{props.preview}</Preview>
      <Body
        style={{ backgroundColor: '#E6EDF4', color: ink, fontFamily: sans, margin: 0, padding: '20px 8px' }}
      >
        <Container
          role="main"
          style={{ backgroundColor: '#FFFFFF', maxWidth: 600, borderTop: `12px solid ${plies[props.ply]}` }}
        >
          <Section style={{ padding: '24px 24px 8px' }}>
            <Heading
              as="h1"
              style={{ fontFamily: serif, fontSize: 26, lineHeight: '32px', margin: '0 0 8px' }}
            >
              {props.title}
            </Heading>
            {props.children}
          </Section>
          <Section style={{ padding: '4px 24px 20px' }}>
            <Hr style={{ borderColor: rule, margin: '8px 0 12px' }} />
            <Text style={{ color: soft, fontSize: 14, lineHeight: '20px', margin: 0 }}>{props.footer}</Text>
          </Section>
        </Container>
      </Body>
    </Html>
  )
}

export function Para(props: { children: ReactNode }) {
  return <Text style={{ fontSize: 17, lineHeight: '26px', margin: '0 0 12px' }}>{props.children}</Text>
}

export function Small(props: { children: ReactNode }) {
  return (
    <Text style={{ fontSize: 15, lineHeight: '22px', color: soft, margin: '0 0 12px' }}>
      {props.children}
    </Text>
  )
}

export function Title2(props: { children: ReactNode }) {
  return (
    <Heading
      as="h2"
      style={{
        fontFamily: serif,
        fontSize: 20,
        lineHeight: '26px',
        margin: '20px 0 6px',
        paddingBottom: 6,
        borderBottom: `3px double ${ink}`,
      }}
    >
      {props.children}
    </Heading>
  )
}

/** Something a person typed: set apart from the direction of the text around it. */
export function Typed(props: { children: string }) {
  return <bdi>{props.children}</bdi>
}

/** One ruled line: a fact's name and the fact. */
export function Fact(props: { name: string; children: ReactNode }) {
  return (
    <Row style={{ borderBottom: `1px solid ${rule}` }}>
      <Column
        style={{ width: 130, padding: '8px 8px 8px 0', color: soft, fontSize: 15, verticalAlign: 'top' }}
      >
        {props.name}
      </Column>
      <Column style={{ padding: '8px 0', fontSize: 16, fontWeight: 600, lineHeight: '22px' }}>
        {props.children}
      </Column>
    </Row>
  )
}

/** One ruled line of the order: what it is, and its amount in the column of amounts. */
export function AmountLine(props: {
  code?: string
  children: ReactNode
  note?: ReactNode
  amount: string
  strong?: boolean
}) {
  const weight = props.strong ? 700 : 400
  return (
    <Row style={{ borderBottom: `1px solid ${props.strong ? ink : rule}` }}>
      <Column
        style={{
          padding: '8px 8px 8px 0',
          fontSize: props.strong ? 20 : 16,
          fontWeight: weight,
          fontFamily: props.strong ? serif : sans,
          lineHeight: '23px',
        }}
      >
        {props.code && (
          <span
            style={{
              fontFamily: mono,
              border: `1px solid ${ink}`,
              padding: '0 4px',
              marginRight: 8,
              fontSize: 14,
            }}
          >
            {props.code}
          </span>
        )}
        {props.children}
        {props.note && <span style={{ display: 'block', color: soft, fontSize: 14 }}>{props.note}</span>}
      </Column>
      <Column
        align="right"
        style={{
          padding: '8px 0',
          fontFamily: mono,
          fontSize: props.strong ? 20 : 16,
          fontWeight: weight,
          whiteSpace: 'nowrap',
          verticalAlign: 'top',
        }}
      >
        {props.amount}
      </Column>
    </Row>
  )
}

/** Storage and allergens: the same facts in the same order as on the item, in the order and on the pack slip. */
export function FrostNote(props: { title: string; children: ReactNode }) {
  return (
    <Section style={{ border: `2px solid ${frost}`, padding: '12px 14px', margin: '16px 0' }}>
      <Heading
        as="h2"
        style={{ color: frost, fontFamily: serif, fontSize: 19, lineHeight: '24px', margin: '0 0 6px' }}
      >
        {props.title}
      </Heading>
      {props.children}
    </Section>
  )
}

export function FrostLine(props: { children: ReactNode; strong?: boolean }) {
  return (
    <Text
      style={{
        color: ink,
        fontSize: 16,
        lineHeight: '23px',
        margin: '0 0 6px',
        fontWeight: props.strong ? 700 : 400,
      }}
    >
      {props.children}
    </Text>
  )
}

/** The one thing to do; a plain link that looks like the pay strip. */
export function ActionLink(props: { href: string; children: ReactNode; quiet?: boolean }) {
  return (
    <Section style={{ margin: '14px 0' }}>
      <Link
        href={props.href}
        style={
          props.quiet
            ? { color: '#B3261E', fontSize: 16, fontWeight: 600, textDecoration: 'underline' }
            : {
                backgroundColor: ink,
                color: '#FFFFFF',
                display: 'inline-block',
                fontFamily: serif,
                fontSize: 18,
                fontWeight: 700,
                padding: '14px 24px',
                textDecoration: 'none',
                borderRadius: 3,
              }
        }
      >
        {props.children}
      </Link>
    </Section>
  )
}

/** Five-bar gates in letters that every mail program has, for the eye; the number stands beside them in words. */
export function TallyMarks(props: { count: number }) {
  const gates = Array.from({ length: Math.min(24, Math.floor(props.count / 5)) }, () => '╫╫╫')
  const rest = '|'.repeat(props.count % 5)
  return (
    <span aria-hidden="true" style={{ fontFamily: mono, fontSize: 22, letterSpacing: 2 }}>
      {[...gates, rest].filter(Boolean).join(' ')}
    </span>
  )
}
