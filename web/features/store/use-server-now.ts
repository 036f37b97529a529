import { useEffect, useState } from 'react'

/**
 * The server's clock, as the page last heard it and running on from there; the device's own clock may be wrong.
 * Moves every quarter of a minute.
 */
export function useServerNow(serverNow: string): number {
  const [now, setNow] = useState(() => Date.parse(serverNow))
  useEffect(() => {
    const heard = Date.parse(serverNow)
    const begun = performance.now()
    setNow(heard)
    const timer = setInterval(() => setNow(heard + (performance.now() - begun)), 15_000)
    return () => clearInterval(timer)
  }, [serverNow])
  return now
}
