import { useSyncExternalStore } from 'react'

const never = () => () => {}

/** False on the server and in the first browser rendering, true ever after: for what only the browser knows. */
export function useHydrated(): boolean {
  return useSyncExternalStore(
    never,
    () => true,
    () => false,
  )
}
