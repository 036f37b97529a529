import { isDeepStrictEqual } from 'node:util'
import { demoLinks } from '../../server/demo/demo-ids.ts'
import { type Figure, median } from './figure.ts'
import { send, throughput } from './load.ts'
import { interleave, startPair } from './pair.ts'

/** Reads of a store per second: the same JSON from ours and from bare Express over prepared statements. */
export const storeData: Figure = {
  name: 'store-data',
  unit: 'reads/s',
  goal: '>=0.9',
  async measure() {
    const pair = await startPair()
    try {
      const path = `/api/stores/${demoLinks.maya}`
      const read = async (url: string) => ({ ...(await (await fetch(url + path)).json()), serverNow: '' })
      if (!isDeepStrictEqual(await read(pair.ours), await read(pair.bare)))
        throw new Error('ours and the bare equivalent do not answer the same')
      const run = (url: string) =>
        throughput({
          forMs: 3_000,
          atOnce: 16,
          wanted: 200,
          next: agent => send(agent, new URL(path, url), { method: 'GET' }),
        })
      const { ours, bare } = await interleave(5, run, pair)
      return { ours: median(ours), bare: median(bare) }
    } finally {
      await pair.stop()
    }
  },
}
