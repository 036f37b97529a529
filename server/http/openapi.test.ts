import express from 'express'
import { expect, test } from 'vitest'
import { z } from 'zod'
import { routes } from '../routes.ts'
import { startApp } from '../testing/start-app.ts'
import { mountRoutes } from './mount.ts'
import { route } from './route.ts'

test('the description lists every route with who may call it', async () => {
  const { api } = await startApp({ fakes: false })
  const { status, body } = await api.get('/api/openapi.json')
  expect(status).toBe(200)
  expect(body.openapi).toBe('3.1.0')
  for (const spec of routes) {
    const operation = body.paths[`/api${spec.path.replace(/:(\w+)/g, '{$1}')}`]?.[spec.method]
    expect(operation?.['x-access']?.length, `${spec.method} ${spec.path}`).toBeGreaterThan(0)
  }
  expect(Object.keys(body.paths).some(path => path.startsWith('/api/auth'))).toBe(false)
})

test('the server does not start with a route that declares no access', async () => {
  const { deps } = await startApp({ fakes: false })
  const bare = {
    ...route({
      method: 'get',
      path: '/bare',
      summary: '',
      access: { who: 'anyone' },
      replies: { 200: z.object({}) },
      handler: () => ({ status: 200, body: {} }),
    }),
  }
  expect(() => mountRoutes(express(), deps, [{ ...bare, access: undefined as never }])).toThrow(
    'GET /api/bare declares no access',
  )
  expect(() => mountRoutes(express(), deps, [bare, bare])).toThrow('declared twice')
})

test('wrong methods are told which are right, unknown addresses that there is nothing', async () => {
  const { api } = await startApp({ fakes: false })
  const put = await api.request('PUT', '/api/me', {})
  expect(put.status).toBe(405)
  expect(put.headers.get('allow')).toBe('GET')
  expect((await api.get('/api/nothing')).status).toBe(404)
  expect((await api.get('/api/stores/..%2f..%2fetc%2fpasswd')).status).toBe(404)
})

test('answers carry their protection, and no trace of what they are made with', async () => {
  const { api } = await startApp({ fakes: false })
  const { headers } = await api.get('/api/me')
  expect(headers.get('content-security-policy')).toContain("frame-ancestors 'none'")
  expect(headers.get('referrer-policy')).toBe('same-origin')
  expect(headers.get('x-content-type-options')).toBe('nosniff')
  expect(headers.get('x-powered-by')).toBeNull()
  expect(headers.get('cache-control')).toContain('no-store')
})

test('the log tells of requests without naming what opens something, nor anybody', async () => {
  const app = await startApp()
  const store = app.make.store()
  await app.api.post(
    `/api/stores/${store.token}/orders`,
    { customer: { name: 'Ruth Canary', email: 'canary@example.com' } },
    { 'Idempotency-Key': 'key-canary-1' },
  )
  await app.api.get(`/api/stores/${store.token}`)
  const log = app.logged.join('\n')
  expect(log).toContain('"path":"/api/stores/…/orders"')
  expect(log).not.toContain(store.token)
  expect(log).not.toMatch(/canary/i)
})
