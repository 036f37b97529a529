import { useSyncExternalStore } from 'react'

/** From this width on the order pad stands beside the catalog; the style sheet's `lg`. */
const WIDE = '(min-width: 64rem)'

function subscribe(listener: () => void) {
  const query = window.matchMedia(WIDE)
  query.addEventListener('change', listener)
  return () => query.removeEventListener('change', listener)
}

/** Whether there is room beside the catalog; on the server both forms are drawn and the style sheet hides one. */
export function useWide(): boolean | null {
  return useSyncExternalStore(
    subscribe,
    () => window.matchMedia(WIDE).matches,
    () => null,
  )
}
