import { tallyGroups } from '#shared/tally/tally.ts'

const STROKE_X = [4, 13, 22, 31]

/** A stroke drawn by hand is never quite upright; which way it leans follows from its place. */
function lean(place: number): number {
  return ((place * 7) % 5) - 2
}

/** Five-bar gates up to `count`, and in pale ink those still missing to `goal`. The number is said in words beside it. */
export function TallyMarks({ count, goal, label }: { count: number; goal?: number; label: string }) {
  const total = Math.max(count, goal ?? 0)
  const gates = tallyGroups(total)
  return (
    <span role="img" aria-label={label} className="flex flex-wrap gap-x-3.5 gap-y-2">
      {gates.map((size, gate) => {
        const inked = Math.max(0, Math.min(5, count - gate * 5))
        return (
          <svg
            key={gate}
            width="40"
            height="40"
            viewBox="0 0 40 40"
            fill="none"
            strokeWidth="3.4"
            strokeLinecap="round"
            aria-hidden="true"
          >
            {STROKE_X.slice(0, Math.min(4, size)).map((x, place) => (
              <path
                key={x}
                className={place < inked ? 'stroke-ink' : 'stroke-rule'}
                d={`M${x + 1} 6l${lean(gate + place)} 28`}
              />
            ))}
            {size === 5 && (
              <path
                className={inked === 5 ? 'stroke-ink' : 'stroke-rule'}
                d={`M1 ${27 + lean(gate)}L37 ${10 - lean(gate)}`}
              />
            )}
          </svg>
        )
      })}
    </span>
  )
}
