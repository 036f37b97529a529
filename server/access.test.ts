import { eq } from 'drizzle-orm'
import { expect, test } from 'vitest'
import type { DriveRole, StaffRole } from '#shared/people/contract.ts'
import { order } from './db/schema/orders.ts'
import { driveMember } from './db/schema/people.ts'
import type { Access, AnyRoute } from './http/route.ts'
import { routes } from './routes.ts'
import { anOrder } from './testing/builders.ts'
import { signedIn } from './testing/sign-in.ts'
import { type Answer, type makeApi, startApp, type TestApp } from './testing/start-app.ts'

type Api = ReturnType<typeof makeApi>
type World = 'own' | 'foreign'

/** Somebody who asks, and what they are: in their own drive, to their own seller, at the operator. */
type Principal = {
  name: string
  api: Api
  signedIn: boolean
  member?: DriveRole
  guardian?: boolean
  staff?: StaffRole
  /** A rep who runs the own drive. */
  runs?: boolean
}

/** Two drives that know nothing of each other, each with a seller, a link and an order. */
async function twoDrives(app: TestApp) {
  const rep = app.make.user({ name: 'Rep of the own drive' })
  app.make.staff(rep.id, 'rep')
  const build = async (repUserId: string | undefined, name: string) => {
    const store = app.make.store({ organizationName: name, ...(repUserId && { repUserId }) })
    const placed = await app.api.post(`/api/stores/${store.token}/orders`, anOrder(), {
      'Idempotency-Key': `order-of-${name}`,
    })
    const receipt = placed.body.receiptUrl.split('/').at(-1) as string
    const teammate = app.make.user()
    app.make.member(store.drive, teammate.id, 'lead')
    return {
      store,
      ids: {
        driveId: store.drive.publicId,
        sellerId: store.seller.publicId,
        token: store.token,
        receipt,
        orderId: app.deps.db.orm.select().from(order).where(eq(order.publicId, receipt)).get()!.publicId,
        userId: teammate.id,
        letterId: '1',
      } as Record<string, string>,
    }
  }
  return { rep, own: await build(rep.id, 'Own'), foreign: await build(undefined, 'Foreign') }
}

async function everybody(app: TestApp, world: Awaited<ReturnType<typeof twoDrives>>): Promise<Principal[]> {
  const { own } = world
  const enter = async (user: { id: string; email: string }) => (await signedIn(app, user)).api
  const member = async (role: DriveRole): Promise<Principal> => {
    const user = app.make.user()
    app.make.member(own.store.drive, user.id, role)
    return { name: role, api: await enter(user), signedIn: true, member: role }
  }
  const staff = async (role: StaffRole): Promise<Principal> => {
    const user = app.make.user()
    app.make.staff(user.id, role)
    return { name: role, api: await enter(user), signedIn: true, staff: role }
  }
  const parent = app.make.user()
  app.make.guardian(own.store.seller, parent.id)
  const nobody = app.make.user()
  const demoted = app.make.user()
  app.make.member(own.store.drive, demoted.id, 'lead')
  const demotedApi = await enter(demoted)
  app.deps.db.orm.delete(driveMember).where(eq(driveMember.userId, demoted.id)).run()
  return [
    { name: 'anonymous', api: app.api, signedIn: false },
    { name: 'signed in, with nothing of their own', api: await enter(nobody), signedIn: true },
    { name: 'guardian', api: await enter(parent), signedIn: true, guardian: true },
    await member('helper'),
    await member('treasurer'),
    await member('lead'),
    await staff('warehouse'),
    await staff('clerk'),
    { name: 'rep of another drive', api: (await staff('rep')).api, signedIn: true, staff: 'rep' },
    { name: 'rep of the drive', api: await enter(world.rep), signedIn: true, staff: 'rep', runs: true },
    await staff('admin'),
    { name: 'demoted lead', api: demotedApi, signedIn: true },
  ]
}

/** What must happen, worked out from who somebody is; 'in' means that the request gets past the door. */
function expected(access: Access, who: Principal, where: World): 'in' | 401 | 403 | 404 {
  if (access.who === 'anyone' || access.who === 'customer' || access.who === 'payment_service') return 'in'
  if (!who.signedIn) return 401
  if (access.who === 'signed_in') return 'in'
  if (access.who === 'guardian') return who.guardian && where === 'own' ? 'in' : 404
  if (access.who === 'staff') return who.staff && access.roles.includes(who.staff) ? 'in' : 404
  if (who.member && where === 'own') return access.roles.includes(who.member) ? 'in' : 403
  if (!who.staff || !access.staff.includes(who.staff)) return 404
  if (who.staff === 'rep') return who.runs && where === 'own' ? 'in' : 404
  return 'in'
}

function ask(spec: AnyRoute, api: Api, ids: Record<string, string>): Promise<Answer> {
  const path = spec.path.replace(/:(\w+)/g, (_all, name: string) => ids[name] ?? 'A'.repeat(22))
  return spec.method === 'get'
    ? api.get(`/api${path}`)
    : api.request(spec.method.toUpperCase(), `/api${path}`, {})
}

/** Routes that end somebody's session or take something away come last, so that the others are asked first. */
const isDrastic = (spec: AnyRoute) => /sign-out|reset|replace|withdraw|second-factor/.test(spec.path)

test('every route, every principal, own and foreign: nobody gets further than their role', async () => {
  const app = await startApp()
  const world = await twoDrives(app)
  const principals = await everybody(app, world)
  const wrong: string[] = []
  let asked = 0
  const doors = [...routes].sort((a, b) => Number(isDrastic(a)) - Number(isDrastic(b)))
  // What must stay out is asked first of all, so that no let-in request can have changed the picture.
  for (const round of ['out', 'in'] as const)
    for (const spec of doors)
      for (const who of principals)
        for (const where of ['own', 'foreign'] as const) {
          if (!/:(driveId|sellerId)/.test(spec.path) && where === 'foreign') continue
          const want = expected(spec.access, who, where)
          if ((want === 'in') !== (round === 'in')) continue
          if (want === 'in' && isDrastic(spec)) continue
          const { status } = await ask(spec, who.api, world[where].ids)
          asked += 1
          const isIn = ![401, 403, 405].includes(status) && status < 500
          if (want === 'in' ? !isIn : status !== want)
            wrong.push(
              `${who.name}, ${where}: ${spec.method.toUpperCase()} ${spec.path} answered ${status}, not ${want}`,
            )
        }
  expect(wrong).toEqual([])
  expect(asked).toBeGreaterThan(routes.length * 10)
}, 120_000)

test('what is another’s and what does not exist are answered alike, byte for byte but for the request’s id', async () => {
  const app = await startApp()
  const world = await twoDrives(app)
  const lead = app.make.user()
  app.make.member(world.own.store.drive, lead.id, 'lead')
  const { api } = await signedIn(app, lead)
  for (const spec of routes.filter(route => /:(driveId|sellerId)/.test(route.path))) {
    const foreign = await ask(spec, api, world.foreign.ids)
    const nothing = await ask(spec, api, {})
    const strip = (answer: Answer) => ({ status: answer.status, body: { ...answer.body, requestId: '' } })
    expect(strip(foreign), spec.path).toEqual(strip(nothing))
    expect(foreign.status, spec.path).toBe(404)
  }
}, 60_000)

test.each([
  '1',
  '-1',
  '1.5',
  '999999999999999999999',
  'undefined',
  '%00',
  '[object%20Object]',
  'A'.repeat(10_000),
])('the id %s names nothing', async id => {
  const app = await startApp({ fakes: false })
  const store = app.make.store()
  const lead = app.make.user()
  app.make.member(store.drive, lead.id, 'lead')
  const { api } = await signedIn(app, lead)
  for (const path of [
    `/api/drives/${id}`,
    `/api/drives/${store.drive.publicId}/orders/${id}`,
    `/api/sellers/${id}`,
    `/api/stores/${id}`,
  ])
    expect([400, 404, 414, 431], path.slice(0, 60)).toContain((await api.get(path)).status)
})
