import { writeFileSync } from 'node:fs'
import { parseArgs } from 'node:util'
import { type Row, toRow } from './figure.ts'
import { orderPlace } from './order-place.ts'
import { storeData } from './store-data.ts'

const figures = [orderPlace, storeData]
const { values } = parseArgs({ options: { json: { type: 'string' }, only: { type: 'string' } } })
const wanted = values.only?.split(',')
const rows: Row[] = []
for (const figure of figures.filter(({ name }) => !wanted || wanted.includes(name))) {
  const row = await toRow(figure)
  rows.push(row)
  const verdict = row.pass ? 'holds' : 'MISSED'
  process.stdout.write(
    `${row.name.padEnd(16)} ours ${row.value} ${row.unit}, bare ${row.limit}, ratio ${row.ratio}, goal ${row.goal}: ${verdict}\n`,
  )
}
if (values.json) writeFileSync(values.json, `${JSON.stringify(rows, null, 2)}\n`)
process.exit(0)
