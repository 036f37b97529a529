/** The longest a stop may take; after that the process ends anyway. What is kept is on disk by then. */
const STOP_LIMIT_MS = 1_500

/**
 * Runs one stand-in as a process: says where it listens, and stops on SIGTERM, SIGINT or when the parent that
 * started it is gone. A failure to start is told in one line and ends with exit code 1.
 */
export async function runProcess(
  start: () => Promise<{ lines: string[]; close(): Promise<void> }>,
): Promise<void> {
  let running: { lines: string[]; close(): Promise<void> } | undefined
  let stopping = false
  const stop = () => {
    if (stopping) return
    stopping = true
    setTimeout(() => process.exit(0), STOP_LIMIT_MS).unref()
    const closed = running ? running.close() : Promise.resolve()
    closed.then(
      () => process.exit(0),
      () => process.exit(1),
    )
  }
  process.on('SIGTERM', stop)
  process.on('SIGINT', stop)
  process.on('disconnect', stop)
  try {
    running = await start()
  } catch (error) {
    console.error(error instanceof Error ? error.message : String(error))
    process.exit(1)
  }
  if (stopping) return void running.close().finally(() => process.exit(0))
  // A parent that is told says it in its own words.
  if (process.send) process.send({ ready: true })
  else for (const line of running.lines) console.log(line)
}

/** A port from the environment. @throws Error naming the variable. */
export function portFrom(name: string, fallback: number): number {
  const text = process.env[name]
  if (text === undefined || text === '') return fallback
  const port = /^\d{1,5}$/.test(text) ? Number(text) : Number.NaN
  if (!(port < 65_536)) throw new Error(`${name} must be a port number, not "${text}"`)
  return port
}
