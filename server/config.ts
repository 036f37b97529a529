import { z } from 'zod'

const port = (fallback: string) =>
  z
    .string()
    .regex(/^\d{1,5}$/, 'must be a port number')
    .default(fallback)
    .transform(Number)
    .refine(n => n < 65_536, 'must be a port number')

const address = z.string().refine(text => {
  try {
    return ['http:', 'https:'].includes(new URL(text).protocol)
  } catch {
    return false
  }
}, 'must be an http or https address')

const environment = z.object({
  TALLYKIN_MODE: z.enum(['development', 'test', 'demo', 'production']).default('production'),
  PORT: port('4310'),
  PUBLIC_URL: address.optional(),
  DATA_DIR: z.string().min(1).default('./data'),
  TALLYKIN_NOW: z.iso
    .datetime({ offset: true, message: 'must be an ISO instant such as 2026-11-20T23:59:00Z' })
    .optional(),
  STRIPE_SECRET_KEY: z.string().min(8, "must be the payment service's secret key"),
  STRIPE_WEBHOOK_SECRET: z.string().min(8, 'must be the secret the payment service signs its webhooks with'),
  STRIPE_API_BASE: address.optional(),
  SMTP_URL: z.string().regex(/^smtps?:\/\/.+/, 'must be an smtp:// or smtps:// address'),
  MAIL_FROM: z.string().email('must be an e-mail address').default('no-reply@tallykin.example'),
  AUTH_SECRET: z.string().min(32, 'must have at least 32 characters'),
  TRUST_PROXY_HOPS: z
    .string()
    .regex(/^\d$/, 'must be the number of proxies in front of the server')
    .default('0')
    .transform(Number),
  ORDERS_PER_LINK_PER_MINUTE: z
    .string()
    .regex(/^\d{1,9}$/, 'must be a number of orders')
    .default('1200')
    .transform(Number),
  LOG_LEVEL: z.enum(['debug', 'info', 'warn', 'error', 'silent']).default('info'),
  FAULT: z.string().optional(),
})

export type Mode = z.infer<typeof environment>['TALLYKIN_MODE']

export type Config = {
  mode: Mode
  port: number
  publicUrl: string
  dataDir: string
  startsAt: number | null
  stripe: { secretKey: string; webhookSecret: string; apiBase: string | null }
  mail: { smtpUrl: string; from: string }
  authSecret: string
  trustProxyHops: number
  ordersPerLinkPerMinute: number
  logLevel: string
  fault: string | null
}

/**
 * Reads the whole configuration from the environment.
 *
 * @throws Error whose message lists every problem at once, one line each, naming the variable.
 */
export function loadConfig(env: Record<string, string | undefined>): Config {
  const given = Object.fromEntries(
    Object.entries(env).filter(([, value]) => value !== undefined && value !== ''),
  )
  const parsed = environment.safeParse(given)
  const problems = parsed.success
    ? []
    : parsed.error.issues.map(
        issue =>
          `${issue.path.join('.')} ${env[String(issue.path[0])] === undefined ? 'is missing: it ' : ''}${issue.message}`,
      )
  if (parsed.success) problems.push(...productionProblems(parsed.data))
  if (!parsed.success || problems.length > 0) throw new Error(problems.join('\n'))

  const e = parsed.data
  return {
    mode: e.TALLYKIN_MODE,
    port: e.PORT,
    publicUrl: new URL(e.PUBLIC_URL ?? `http://localhost:${e.PORT}`).origin,
    dataDir: e.DATA_DIR,
    startsAt: e.TALLYKIN_NOW ? Date.parse(e.TALLYKIN_NOW) : null,
    stripe: {
      secretKey: e.STRIPE_SECRET_KEY,
      webhookSecret: e.STRIPE_WEBHOOK_SECRET,
      apiBase: e.STRIPE_API_BASE ?? null,
    },
    mail: { smtpUrl: e.SMTP_URL, from: e.MAIL_FROM },
    authSecret: e.AUTH_SECRET,
    trustProxyHops: e.TRUST_PROXY_HOPS,
    ordersPerLinkPerMinute: e.ORDERS_PER_LINK_PER_MINUTE,
    logLevel: e.LOG_LEVEL,
    fault: e.FAULT ?? null,
  }
}

/** What is convenient elsewhere and dangerous where real money moves. */
function productionProblems(e: z.infer<typeof environment>): string[] {
  const problems: string[] = []
  if (e.FAULT && e.TALLYKIN_MODE !== 'test') problems.push('FAULT is for test runs only')
  if (e.TALLYKIN_MODE !== 'production') return problems
  if (e.TALLYKIN_NOW) problems.push('TALLYKIN_NOW is refused in production: the clock is the clock')
  if (e.STRIPE_API_BASE) problems.push('STRIPE_API_BASE is refused in production: it points at a stand-in')
  if (!e.PUBLIC_URL?.startsWith('https://'))
    problems.push('PUBLIC_URL must be an https address in production')
  if (!/^(sk|rk)_live_/.test(e.STRIPE_SECRET_KEY))
    problems.push('STRIPE_SECRET_KEY must be a live key in production')
  if (/^(.)\1+$/.test(e.AUTH_SECRET)) problems.push('AUTH_SECRET must not be one character repeated')
  return problems
}
