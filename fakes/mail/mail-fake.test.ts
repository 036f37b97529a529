import { mkdtempSync, rmSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { createTransport } from 'nodemailer'
import { expect, onTestFinished, test } from 'vitest'
import { startMailFake } from './app.ts'

const NOW = Date.parse('2026-11-20T15:00:00Z')

async function startForTest(options: { dataDir?: string; host?: string } = {}) {
  const dataDir = options.dataDir ?? mkdtempSync(join(tmpdir(), 'mail-'))
  const fake = await startMailFake({ httpPort: 0, smtpPort: 0, dataDir, now: () => NOW })
  const transport = createTransport({
    host: options.host ?? '127.0.0.1',
    port: fake.smtpPort,
    ignoreTLS: true,
    pool: true,
    maxConnections: 2,
  })
  let isClosed = false
  const close = async () => {
    if (isClosed) return
    isClosed = true
    transport.close()
    await fake.close()
  }
  onTestFinished(async () => {
    await close()
    rmSync(dataDir, { recursive: true, force: true })
  })
  const call = async (method: string, path: string, body?: unknown) => {
    const response = await fetch(fake.httpUrl + path, {
      method,
      ...(body !== undefined && { body: JSON.stringify(body) }),
    })
    const text = await response.text()
    return { status: response.status, body: text === '' ? null : JSON.parse(text) }
  }
  const send = (changes: Record<string, unknown> = {}) => transport.sendMail({ ...letter(), ...changes })
  return { ...fake, dataDir, close, call, send, messages: async () => (await call('GET', '/messages')).body }
}

const letter = () => ({
  from: { name: 'Tallykin', address: 'orders@tallykin.example' },
  to: { name: 'Ruth Okafor', address: 'ruth@example.org' },
  subject: 'Your order from Saltmarsh High Robotics – thank you',
  text: 'Keep at 0 °F (−18 °C).\nSee http://localhost:4310/r/abc',
  html: '<html><head><title>x</title></head><body><p>Keep at 0 °F</p><a href="http://localhost:4310/r/abc">See</a></body></html>',
  messageId: '<letter-1@tallykin.example>',
  headers: { 'X-Letter': 'receipt', 'List-Unsubscribe': '<http://localhost:4310/u/1>' },
})

test('a letter is listed with its plain addresses, both parts and its headers, newest first', async () => {
  const { send, messages, call } = await startForTest()
  await send()
  await send({ subject: 'Second' })

  const all = await messages()

  expect(all.map((message: { subject: string }) => message.subject)).toEqual([
    'Second',
    'Your order from Saltmarsh High Robotics – thank you',
  ])
  expect(all[1]).toMatchObject({
    to: 'ruth@example.org',
    from: 'orders@tallykin.example',
    date: '2026-11-20T15:00:00.000Z',
    text: expect.stringContaining('0 °F (−18 °C)'),
    html: expect.stringContaining('<p>Keep at 0 °F</p>'),
    headers: {
      'message-id': '<letter-1@tallykin.example>',
      'x-letter': 'receipt',
      'list-unsubscribe': '<http://localhost:4310/u/1>',
      subject: 'Your order from Saltmarsh High Robotics – thank you',
    },
  })
  expect((await call('GET', `/messages/${all[1].id}`)).body).toEqual(all[1])
  expect((await call('GET', '/messages/none')).status).toBe(404)
})

test('letters are there after a restart, and gone when the catcher is emptied', async () => {
  const before = await startForTest()
  await before.send()
  await before.call('POST', '/notes', { title: 'Codes', rows: [{ label: 'lead', value: '123456' }] })
  await before.close()

  const after = await startForTest({ dataDir: before.dataDir })
  const kept = await after.messages()
  await after.call('DELETE', '/messages')

  expect(kept).toHaveLength(1)
  expect(await after.messages()).toEqual([])
  expect((await after.call('GET', '/notes')).body).toHaveLength(1)
})

// RFC 5321, 4.2.1: 4yz is refused for now, 5yz for good.
test.each([
  ['refuseNext', 451],
  ['rejectNext', 550],
])('%s: so many letters are refused with %i, the next is taken', async (behaviour, code) => {
  const { send, call, messages } = await startForTest()
  await call('POST', '/behaviour', { [behaviour]: 2 })

  await expect(send()).rejects.toMatchObject({ responseCode: code })
  await expect(send()).rejects.toMatchObject({ responseCode: code })
  await send()

  expect(await messages()).toHaveLength(1)
})

test('dropConnectionNext: the connection breaks while the letter is handed over, and it is not kept', async () => {
  const { send, call, messages } = await startForTest()
  await call('POST', '/behaviour', { dropConnectionNext: 1 })

  await expect(send()).rejects.toThrow()
  const afterDrop = await messages()
  await send()

  expect(afterDrop).toEqual([])
  expect(await messages()).toHaveLength(1)
})

test('loseAnswerNext: the sender hears nothing, and the letter is kept all the same', async () => {
  const { send, call, messages } = await startForTest()
  await call('POST', '/behaviour', { loseAnswerNext: 1 })

  await expect(send()).rejects.toThrow()
  await send()

  const ids = (await messages()).map(
    (message: { headers: Record<string, string> }) => message.headers['message-id'],
  )
  expect(ids).toEqual(['<letter-1@tallykin.example>', '<letter-1@tallykin.example>'])
})

test('latencyMs: a letter takes so long, and closing does not wait for it', async () => {
  const { send, call, close } = await startForTest()
  await call('POST', '/behaviour', { latencyMs: 200 })
  const begun = performance.now()
  await send()
  const took = performance.now() - begun
  await call('POST', '/behaviour', { latencyMs: 600_000 })
  const stuck = send().catch(error => error)
  await new Promise(resolve => setTimeout(resolve, 100))

  const closing = performance.now()
  await close()

  expect(took).toBeGreaterThanOrEqual(200)
  expect(performance.now() - closing).toBeLessThan(1_000)
  expect(await stuck).toBeInstanceOf(Error)
})

test('a behaviour nobody knows is refused', async () => {
  const { call } = await startForTest()
  expect((await call('POST', '/behaviour', { refuse: 1 })).status).toBe(400)
  expect((await call('POST', '/behaviour', { refuseNext: '1' })).status).toBe(400)
})

test('the sender may name the machine instead of its number', async () => {
  const { send, messages } = await startForTest({ host: 'localhost' })
  await send()
  expect(await messages()).toHaveLength(1)
})

test('a hundred letters over two connections are all kept', async () => {
  const { send, messages } = await startForTest()
  await Promise.all(Array.from({ length: 100 }, (_, n) => send({ subject: `Letter ${n}` })))
  const subjects = (await messages()).map((message: { subject: string }) => message.subject)
  expect(new Set(subjects).size).toBe(100)
})

test('the page shows the list, and a letter in a frame that runs nothing', async () => {
  const { send, messages, httpUrl } = await startForTest()
  await send({ subject: '<b>Hello</b>' })
  const [message] = await messages()

  const list = await (await fetch(httpUrl)).text()
  const letterPage = await (await fetch(`${httpUrl}/?message=${message.id}`)).text()
  const frame = await fetch(`${httpUrl}/messages/${message.id}/html`)
  const framed = await frame.text()
  const text = await (await fetch(`${httpUrl}/?message=${message.id}&part=text`)).text()

  expect(list).toContain('1 letter')
  expect(list).toContain('&lt;b&gt;Hello')
  expect(letterPage).toContain(`src="/messages/${message.id}/html"`)
  expect(letterPage).toMatch(/sandbox="allow-popups allow-popups-to-escape-sandbox"/)
  expect(framed).toContain('<head><base target="_blank">')
  expect(frame.headers.get('content-security-policy')).toMatch(/^sandbox allow-popups/)
  expect(text).toContain('<a href="http://localhost:4310/r/abc" target="_blank" rel="noopener">')
})

test('a note is shown beside the letters, and one of the same title takes its place', async () => {
  const { call, httpUrl } = await startForTest()
  await call('POST', '/notes', { title: 'Codes', rows: [{ label: 'lead', value: '111111' }] })
  await call('POST', '/notes', { title: 'Codes', rows: [{ label: 'lead <1>', value: '222222' }] })

  const page = await (await fetch(httpUrl)).text()

  expect(page).toContain('222222')
  expect(page).toContain('lead &lt;1&gt;')
  expect(page).not.toContain('111111')
  expect((await call('POST', '/notes', { title: 'x', rows: [{}] })).status).toBe(400)
})
