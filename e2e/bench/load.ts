import { Agent, request } from 'node:http'

/** Sends one request on a kept connection and reads the whole answer. */
export function send(
  agent: Agent,
  url: URL,
  options: { method: string; headers?: Record<string, string>; body?: string },
): Promise<{ status: number; body: string }> {
  return new Promise((resolve, reject) => {
    const call = request(url, { agent, method: options.method, headers: options.headers }, response => {
      let body = ''
      response.setEncoding('utf8')
      response.on('data', (part: string) => {
        body += part
      })
      response.on('end', () => resolve({ status: response.statusCode ?? 0, body }))
    })
    call.on('error', reject)
    call.end(options.body)
  })
}

/** Requests per second over so many milliseconds, so many at once. Every answer must have the wanted status. */
export async function throughput(options: {
  forMs: number
  atOnce: number
  wanted: number
  next: (agent: Agent, n: number) => Promise<{ status: number; body: string }>
}): Promise<number> {
  const agent = new Agent({ keepAlive: true, maxSockets: options.atOnce })
  const begun = performance.now()
  let count = 0
  let serial = 0
  await Promise.all(
    Array.from({ length: options.atOnce }, async () => {
      while (performance.now() - begun < options.forMs) {
        const { status, body } = await options.next(agent, serial++)
        if (status !== options.wanted) throw new Error(`answered ${status}: ${body.slice(0, 300)}`)
        count += 1
      }
    }),
  )
  const seconds = (performance.now() - begun) / 1000
  agent.destroy()
  return count / seconds
}
