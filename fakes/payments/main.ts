import { clockFrom } from '../clock.ts'
import { portFrom, runProcess } from '../run-process.ts'
import { startPaymentFake } from './app.ts'

await runProcess(async () => {
  const { env } = process
  const webhookSecret = env.STRIPE_WEBHOOK_SECRET
  if (!webhookSecret)
    throw new Error('STRIPE_WEBHOOK_SECRET is missing: the secret that webhooks are signed with')
  const port = portFrom('PAYMENT_PORT', 4311)
  const shop = env.PUBLIC_URL || `http://localhost:${portFrom('PORT', 4310)}`
  const fake = await startPaymentFake({
    port,
    dataDir: env.DATA_DIR || './data',
    webhookUrl: `${new URL(shop).origin}/api/webhooks/payments`,
    webhookSecret,
    now: clockFrom(env.TALLYKIN_NOW),
    ...(port !== 0 && { publicUrl: `http://localhost:${port}` }),
    ...(env.STRIPE_SECRET_KEY && { secretKey: env.STRIPE_SECRET_KEY }),
  })
  return {
    lines: [`Payment stand-in: http://localhost:${fake.port} (a demonstration; it charges nobody)`],
    close: fake.close,
  }
})
