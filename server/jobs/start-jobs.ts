import type { Deps } from '../deps.ts'
import { makeMailWorker } from '../mail/worker.ts'
import { finishOpenRefunds } from '../orders/refund-order.ts'
import { makeReconciler } from '../payments/reconcile.ts'
import { takeLease } from './lease.ts'

const MAIL_EVERY_MS = 500
const RECONCILE_EVERY_MS = 4_000

/** Starts the work that goes on by itself: sending mail, asking about waiting payments. Returns how to stop it. */
export function startJobs(deps: Deps): { stop: () => Promise<void> } {
  const mail = makeMailWorker(deps)
  const reconciler = makeReconciler(deps)
  let first = true
  const loops = [
    repeat(deps, 'mail', MAIL_EVERY_MS, () => mail.round()),
    repeat(deps, 'reconcile', RECONCILE_EVERY_MS, async () => {
      // What a crash left behind is looked at on every start; each step of it may be done twice.
      if (!takeLease(deps, 'reconcile', RECONCILE_EVERY_MS * 3) && !first) return
      await reconciler.round({ all: first })
      await finishOpenRefunds(deps)
      first = false
    }),
  ]
  return {
    async stop() {
      await Promise.all(loops.map(loop => loop.stop()))
    },
  }
}

/** Runs `work` again and again with a pause between; a failure is logged and does not end the loop. */
function repeat(deps: Deps, name: string, pauseMs: number, work: () => Promise<void>) {
  let stopped = false
  let wake: () => void = () => {}
  const done = (async () => {
    while (!stopped) {
      try {
        await work()
      } catch (error) {
        deps.log.error(
          { job: name, error: (error as Error).message, stack: (error as Error).stack },
          'job failed',
        )
      }
      if (stopped) return
      await new Promise<void>(resolve => {
        const timer = setTimeout(resolve, pauseMs)
        wake = () => {
          clearTimeout(timer)
          resolve()
        }
      })
    }
  })()
  return {
    async stop() {
      stopped = true
      wake()
      await done
    },
  }
}
