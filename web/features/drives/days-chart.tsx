import { formatDay } from '#shared/deadline/formatting.ts'
import type { DriveView } from '#shared/drives/contract.ts'
import { useWords } from '../../lib/i18n.tsx'

const HEIGHT = 72

/** Items sold by day, as columns ruled in ink; the same figures stand in a table for screen readers. */
export function DaysChart({ view }: { view: DriveView }) {
  const { t, locale } = useWords()
  const most = Math.max(1, ...view.days.map(day => day.items))
  if (view.days.length === 0) return null
  return (
    <div className="mt-5">
      <h3 className="text-[1.05rem]">{t('organizer.days')}</h3>
      <svg
        className="mt-2 w-full"
        viewBox={`0 0 ${view.days.length * 24} ${HEIGHT + 4}`}
        preserveAspectRatio="none"
        height={HEIGHT}
        aria-hidden="true"
      >
        {view.days.map((day, place) => {
          const tall = Math.max(1, (day.items / most) * HEIGHT)
          return (
            <rect
              key={day.day}
              className="fill-canary stroke-ink"
              strokeWidth="1"
              vectorEffect="non-scaling-stroke"
              x={place * 24 + 3}
              y={HEIGHT - tall + 2}
              width="18"
              height={tall}
            />
          )
        })}
      </svg>
      <table className="sr-only">
        <tbody>
          {view.days.map(day => (
            <tr key={day.day}>
              <th>{formatDay(day.day, locale)}</th>
              <td>{day.items}</td>
            </tr>
          ))}
        </tbody>
      </table>
    </div>
  )
}
