import { useMemo, useSyncExternalStore } from 'react'
import { emptyPad, makePadStore, type Pad, type PadStore } from './pad.ts'

const stores = new Map<string, PadStore>()

function padStoreOf(token: string): PadStore {
  let store = stores.get(token)
  if (!store) {
    let storage: Storage | null = null
    try {
      storage = window.localStorage
    } catch {
      // Forbidden by the browser's settings.
    }
    store = makePadStore(token, storage)
    stores.set(token, store)
  }
  return store
}

/** The pad of a store; empty on the server and in the first browser rendering, which must agree. */
export function usePad(token: string): { pad: Pad; change: PadStore['change'] } {
  const store = useMemo(() => (typeof window === 'undefined' ? null : padStoreOf(token)), [token])
  const pad = useSyncExternalStore(
    store ? store.subscribe : () => () => {},
    () => (store ? store.get() : emptyPad),
    () => emptyPad,
  )
  return { pad, change: change => store?.change(change) }
}
