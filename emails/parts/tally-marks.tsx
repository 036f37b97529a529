import { tallyGroups } from '#shared/tally/tally.ts'
import { colors, faces } from './ink.ts'

/** Beyond this many strokes a drawing says less than the number, which stands beside it anyway. */
const MOST_STROKES = 100

/**
 * Five-bar gates in plain characters: four bars struck through for five. The strokes still missing to `goal`
 * follow in pale ink. For the eye only; the number stands beside it in words.
 */
export function TallyMarks(props: { count: number; goal: number }) {
  if (props.goal > MOST_STROKES || props.count > MOST_STROKES) return null
  const gates = tallyGroups(Math.max(props.count, props.goal))
  return (
    <p
      aria-hidden="true"
      style={{
        fontFamily: faces.sans,
        fontSize: 26,
        lineHeight: '38px',
        fontWeight: 700,
        margin: '12px 0 8px',
      }}
    >
      {gates.map((size, gate) => (
        <Gate key={gate} size={size} inked={Math.max(0, Math.min(5, props.count - gate * 5))} />
      ))}
    </p>
  )
}

function Gate(props: { size: number; inked: number }) {
  const bars = Math.min(4, props.size)
  const dark = Math.min(bars, props.inked)
  const slash = props.inked === 5 ? colors.ink : colors.rule
  return (
    <>
      <span
        style={{
          color: slash,
          letterSpacing: 4,
          textDecoration: props.size === 5 ? 'line-through' : 'none',
          whiteSpace: 'nowrap',
        }}
      >
        {dark > 0 && <span style={{ color: colors.ink }}>{'|'.repeat(dark)}</span>}
        {bars > dark && <span style={{ color: colors.rule }}>{'|'.repeat(bars - dark)}</span>}
      </span>
      {'\u2002 '}
    </>
  )
}

/** The same for a text part: "||||/" is five. */
export function tallyText(count: number): string {
  if (count > MOST_STROKES) return ''
  return tallyGroups(count)
    .map(size => (size === 5 ? '||||/' : '|'.repeat(size)))
    .join(' ')
}
