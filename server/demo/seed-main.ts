import { seedDemo } from './seed-demo.ts'

await seedDemo(process.env)
process.send?.({ ready: true })
process.disconnect?.()
