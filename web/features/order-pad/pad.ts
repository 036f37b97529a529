import type { Relationship } from '#shared/orders/contract.ts'

/** What a customer has written on the order pad of one store. Kept on this device until it is paid. */
export type Pad = {
  lines: { code: string; quantity: number }[]
  /** As typed; cents are read from it when the order is priced. */
  gift: string
  coverFee: boolean
  name: string
  email: string
  relationship: Relationship | ''
  /** The try at ordering this very content, and the receipt it led to. */
  attempt: { key: string; content: string; receiptId: string | null; at: number } | null
  /** The line taken off last, for putting it back. */
  removed: { code: string; quantity: number; place: number } | null
}

export const emptyPad: Pad = {
  lines: [],
  gift: '',
  coverFee: false,
  name: '',
  email: '',
  relationship: '',
  attempt: null,
  removed: null,
}

const VERSION = 1
const keyOf = (token: string) => `tallykin:pad:${token}`

/** Sets how many of an item are on the pad; none takes its line off and remembers it. */
export function setQuantity(pad: Pad, code: string, quantity: number): Pad {
  const place = pad.lines.findIndex(line => line.code === code)
  const old = pad.lines[place]
  if (quantity <= 0) {
    if (!old) return pad
    return {
      ...pad,
      lines: pad.lines.filter(line => line.code !== code),
      removed: { ...old, place },
    }
  }
  if (!old) return { ...pad, lines: [...pad.lines, { code, quantity }], removed: null }
  return { ...pad, lines: pad.lines.map(line => (line.code === code ? { code, quantity } : line)) }
}

/** Puts the line taken off last back where it was. */
export function undoRemoval(pad: Pad): Pad {
  if (!pad.removed || pad.lines.some(line => line.code === pad.removed!.code))
    return { ...pad, removed: null }
  const { place, ...line } = pad.removed
  return { ...pad, lines: [...pad.lines.slice(0, place), line, ...pad.lines.slice(place)], removed: null }
}

/** Reads a kept pad; whatever is not one, by age or damage, is an empty pad. */
export function readPad(text: string | null): Pad {
  if (text === null) return emptyPad
  try {
    const kept = JSON.parse(text) as { version?: unknown; pad?: Partial<Pad> }
    if (kept.version !== VERSION || !kept.pad) return emptyPad
    const { pad } = kept
    const lines = (Array.isArray(pad.lines) ? pad.lines : []).filter(
      line =>
        typeof line?.code === 'string' &&
        Number.isInteger(line.quantity) &&
        line.quantity >= 1 &&
        line.quantity <= 99,
    )
    const text_ = (value: unknown) => (typeof value === 'string' ? value : '')
    return {
      lines,
      gift: text_(pad.gift),
      coverFee: pad.coverFee === true,
      name: text_(pad.name),
      email: text_(pad.email),
      relationship: text_(pad.relationship) as Pad['relationship'],
      attempt: pad.attempt && typeof pad.attempt.key === 'string' ? pad.attempt : null,
      removed: null,
    }
  } catch {
    return emptyPad
  }
}

export type PadStore = {
  get: () => Pad
  change: (change: (pad: Pad) => Pad) => void
  subscribe: (listener: () => void) => () => void
}

/** The pad of one store on this device; several tabs of it show the same. Without storage it lives in the page. */
export function makePadStore(token: string, storage: Storage | null): PadStore {
  const key = keyOf(token)
  let pad = readPad(safely(() => storage?.getItem(key) ?? null))
  const listeners = new Set<() => void>()
  const tell = () => {
    for (const listener of listeners) listener()
  }
  const fromOtherTab = (event: StorageEvent) => {
    if (event.key !== key) return
    pad = readPad(event.newValue)
    tell()
  }
  return {
    get: () => pad,
    change(change) {
      pad = change(pad)
      safely(() => storage?.setItem(key, JSON.stringify({ version: VERSION, pad })) ?? null)
      tell()
    },
    subscribe(listener) {
      if (listeners.size === 0) window.addEventListener('storage', fromOtherTab)
      listeners.add(listener)
      return () => {
        listeners.delete(listener)
        if (listeners.size === 0) window.removeEventListener('storage', fromOtherTab)
      }
    },
  }
}

/** Clears whichever pad led to this receipt, once it is paid; name and address stay for the next order. */
export function clearPaidPad(storage: Storage, receiptId: string) {
  for (const key of Object.keys(storage)) {
    if (!key.startsWith(keyOf(''))) continue
    const pad = readPad(storage.getItem(key))
    if (pad.attempt?.receiptId !== receiptId) continue
    const { name, email, relationship } = pad
    storage.setItem(
      key,
      JSON.stringify({ version: VERSION, pad: { ...emptyPad, name, email, relationship } }),
    )
  }
}

/** Storage may be forbidden or full; the pad then lasts as long as the page. */
function safely<T>(use: () => T): T | null {
  try {
    return use()
  } catch {
    return null
  }
}
