// `npm test`: the whole truth. Every part runs even when an earlier one failed; the last line counts them all.
import { spawn } from 'node:child_process'
import { readFileSync, rmSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { dirname, join } from 'node:path'
import { fileURLToPath } from 'node:url'
import { ensureChromium, ensureInstalled } from './bootstrap.mjs'
import { build } from './build.mjs'

const root = join(dirname(fileURLToPath(import.meta.url)), '../..')
process.chdir(root)
ensureInstalled()
process.env.CHROMIUM_PATH = ensureChromium()

const counts = { passed: 0, failed: 0 }

function run(name, args, { report } = {}) {
  return new Promise(resolve => {
    process.stdout.write(`\n== ${name}\n`)
    const child = spawn(process.execPath, args, { stdio: ['ignore', 'inherit', 'inherit'], env: process.env })
    child.on('exit', code => {
      const counted = report?.() ?? null
      if (counted) {
        counts.passed += counted.passed
        // A run that ends badly without a failing test, such as a crash, counts as one failure.
        counts.failed += counted.failed || (code === 0 ? 0 : 1)
      } else if (code === 0) counts.passed += 1
      else counts.failed += 1
      resolve(code === 0)
    })
  })
}

const bin = path => join(root, 'node_modules', path)
const vitestReport = join(tmpdir(), `tallykin-vitest-${process.pid}.json`)
const playwrightReport = join(tmpdir(), `tallykin-playwright-${process.pid}.json`)

await run('types', [bin('typescript/bin/tsc'), '-p', '.'])
await run('format and lint', [bin('@biomejs/biome/bin/biome'), 'ci', '.'])
await run(
  'unit and integration',
  [
    bin('vitest/vitest.mjs'),
    'run',
    '--reporter=default',
    '--reporter=json',
    `--outputFile.json=${vitestReport}`,
  ],
  {
    report: () => {
      const result = readJson(vitestReport)
      return result && { passed: result.numPassedTests, failed: result.numFailedTests }
    },
  },
)
try {
  process.stdout.write('\n== build\n')
  await build()
  counts.passed += 1
  process.env.PLAYWRIGHT_JSON_OUTPUT_NAME = playwrightReport
  await run(
    'end to end',
    [bin('playwright/cli.js'), 'test', '-c', 'e2e/playwright.config.ts', '--reporter=list,json'],
    {
      report: () => {
        const result = readJson(playwrightReport)
        return (
          result && { passed: result.stats.expected, failed: result.stats.unexpected + result.stats.flaky }
        )
      },
    },
  )
} catch (error) {
  process.stderr.write(`${error.stack}\n`)
  counts.failed += 1
}

process.stdout.write(`\n${counts.passed} passed, ${counts.failed} failed\n`)
process.exit(counts.failed === 0 ? 0 : 1)

function readJson(file) {
  try {
    return JSON.parse(readFileSync(file, 'utf8'))
  } catch {
    return null
  } finally {
    rmSync(file, { force: true })
  }
}
