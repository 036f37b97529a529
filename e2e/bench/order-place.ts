import { demoLinks } from '../../server/demo/demo-ids.ts'
import { type Figure, median } from './figure.ts'
import { send, throughput } from './load.ts'
import { interleave, startPair } from './pair.ts'

let serial = 0

/** Orders placed per second through the whole of ours, and through the bare equivalent. */
export const orderPlace: Figure = {
  name: 'order-place',
  unit: 'orders/s',
  goal: '>=0.5',
  async measure() {
    const pair = await startPair()
    try {
      const links = [demoLinks.maya, demoLinks.anh, demoLinks.zoe, demoLinks.group]
      const body = JSON.stringify({
        lines: [
          { itemCode: '1204', quantity: 2 },
          { itemCode: '6521', quantity: 1 },
        ],
        giftCents: 0,
        coverFee: false,
        quotedTotalCents: 5200,
        customer: { name: 'Ruth Lindqvist', email: 'ruth@example.com', relationship: 'grandparent' },
        locale: 'en',
      })
      const run = (url: string) =>
        throughput({
          forMs: 3_000,
          atOnce: 8,
          wanted: 201,
          next: (agent, n) =>
            send(agent, new URL(`/api/stores/${links[n % links.length]}/orders`, url), {
              method: 'POST',
              headers: { 'Content-Type': 'application/json', 'Idempotency-Key': `bench-order-${++serial}` },
              body,
            }),
        })
      const { ours, bare } = await interleave(5, run, pair)
      return { ours: median(ours), bare: median(bare) }
    } finally {
      await pair.stop()
    }
  },
}
