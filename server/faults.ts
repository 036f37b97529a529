/**
 * Named points at which a test can make the process die, throw or stand still. Outside test runs the
 * configuration refuses to arm one, and `hit` does nothing.
 */
type Armed = { point: string; after: number; how: 'kill' | 'throw' | 'hang' }

let armed: Armed | null = null

/** Arms one fault, written `F10:1:kill`: the first time F10 is reached, the process is killed. */
export function armFault(text: string) {
  const match = /^(F\d{2}):(\d+):(kill|throw|hang)$/.exec(text)
  if (!match) throw new Error(`FAULT must look like F10:1:kill, not ${text}`)
  armed = { point: match[1]!, after: Number(match[2]), how: match[3] as Armed['how'] }
}

export function hit(point: string) {
  if (!armed || armed.point !== point) return
  armed.after -= 1
  if (armed.after > 0) return
  const { how } = armed
  armed = null
  if (how === 'kill') process.kill(process.pid, 'SIGKILL')
  // SIGKILL is delivered at once, but give the kernel no chance to let another statement through.
  if (how === 'hang' || how === 'kill') Atomics.wait(new Int32Array(new SharedArrayBuffer(4)), 0, 0, 10_000)
  throw new Error(`Fault at ${point}`)
}
