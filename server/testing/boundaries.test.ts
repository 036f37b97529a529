import { readdirSync, readFileSync, statSync } from 'node:fs'
import { dirname, join, relative, resolve } from 'node:path'
import { expect, test } from 'vitest'
import { rootDir } from '../paths.ts'

/** Which rooms each room may use, and where code should go instead of reaching further. */
const rooms: Record<string, { may: string[]; instead: string }> = {
  shared: {
    may: ['shared'],
    instead: 'shared knows nobody: pass the value in, or move the code to the room that owns it.',
  },
  emails: {
    may: ['emails', 'shared'],
    instead: 'emails gets everything as props: read it in server/mail/letter-props.ts and pass it in.',
  },
  server: {
    may: ['server', 'shared', 'emails'],
    instead:
      'the server does not read the client: put what both need into shared, or load the built page at run time.',
  },
  web: {
    may: ['web', 'shared'],
    instead: 'the client asks the server over HTTP: put types and pure computation into shared/<domain>/.',
  },
  fakes: {
    may: ['fakes'],
    instead: 'a stand-in speaks the wire and nothing else: give it its own small copy or a test door.',
  },
  e2e: {
    may: ['e2e', 'server', 'shared', 'fakes'],
    instead: 'journeys drive the outside; borrow only builders and the seed.',
  },
}
/** What may step over a border, with the reason. */
const allowed = [
  // Tests of the server run against the real stand-ins.
  /^server\/(testing\/\S+|\S+\.test\.ts) -> fakes\//,
  // A test of the tokens reads the style sheet as a text, and the build compiles catalogs with the shared compiler.
  /^web\/vite\/\S+ -> shared\//,
]

function sources(dir: string): string[] {
  return readdirSync(dir).flatMap(name => {
    const path = join(dir, name)
    if (statSync(path).isDirectory()) return sources(path)
    return /\.(ts|tsx|mjs)$/.test(name) ? [path] : []
  })
}

function importsOf(file: string): string[] {
  const text = readFileSync(file, 'utf8')
  return [...text.matchAll(/(?:from|import)\s*\(?\s*'([^']+)'/g)].map(match => match[1]!)
}

test('imports point one way; who reaches too far is told where the code should go', () => {
  const wrong: string[] = []
  for (const [room, rule] of Object.entries(rooms)) {
    for (const file of sources(join(rootDir, room))) {
      for (const name of importsOf(file)) {
        const target = name.startsWith('#')
          ? name.slice(1)
          : name.startsWith('.')
            ? relative(rootDir, resolve(dirname(file), name))
            : null
        if (target === null) continue
        const step = `${relative(rootDir, file)} -> ${target}`
        const other = target.split('/')[0]!
        if (!(other in rooms) || rule.may.includes(other) || allowed.some(border => border.test(step)))
          continue
        wrong.push(`${step}: ${rule.instead}`)
      }
    }
  }
  expect(wrong).toEqual([])
})

test('pure computation in shared reads no clock, no randomness and no environment', () => {
  const impure = sources(join(rootDir, 'shared'))
    .filter(file => !file.endsWith('.test.ts'))
    .filter(file => /Date\.now\(|new Date\(\)|Math\.random|process\.|crypto/.test(readFileSync(file, 'utf8')))
    .map(file => relative(rootDir, file))
  expect(impure).toEqual([])
})

test('domains of the server are read through their functions: only db/schema and queries speak to tables', () => {
  const wrong = sources(join(rootDir, 'web'))
    .concat(sources(join(rootDir, 'emails')))
    .filter(file => /drizzle-orm|better-sqlite3|express'/.test(readFileSync(file, 'utf8')))
    .map(file => `${relative(rootDir, file)}: only the server speaks to the database`)
  expect(wrong).toEqual([])
})
