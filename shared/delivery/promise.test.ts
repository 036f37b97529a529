import { expect, test } from 'vitest'
import { checkRefundDue, type Delay, delayOutcome } from './promise.ts'

function aDelay(changes: Partial<Delay> = {}): Delay {
  return {
    promisedUntil: '2026-12-18',
    newUntil: '2027-01-08',
    earlierDelays: 0,
    noticeSaidSilenceKeeps: true,
    answer: null,
    timeIsUp: false,
    ...changes,
  }
}

// 16 CFR 435, the mail, internet or telephone order merchandise rule. Whether a given seller is covered: ask counsel.
test.each([
  ['the customer says keep', { answer: 'keep' as const, earlierDelays: 2 }, 'kept'],
  ['the customer says cancel', { answer: 'cancel' as const }, 'canceled'],
  ['silence, first delay, 21 days later', {}, 'kept'],
  ['silence, exactly 30 days later', { newUntil: '2027-01-17' }, 'kept'],
  ['silence, 31 days later', { newUntil: '2027-01-18' }, 'awaiting'],
  ['silence, 31 days later, time is up', { newUntil: '2027-01-18', timeIsUp: true }, 'canceled'],
  [
    'a second notice back within the promise, time is up',
    { newUntil: '2026-12-18', earlierDelays: 1, timeIsUp: true },
    'kept',
  ],
  ['silence on a second delay, time left', { earlierDelays: 1 }, 'awaiting'],
  ['silence on a second delay', { earlierDelays: 1, timeIsUp: true }, 'canceled'],
  ['silence that the notice did not speak of', { noticeSaidSilenceKeeps: false, timeIsUp: true }, 'canceled'],
])('%s: the order is %s', (_what, changes, outcome) => {
  expect(delayOutcome(aDelay(changes))).toBe(outcome)
})

test('a check refund goes out within seven business days (16 CFR 435.1)', () => {
  expect(checkRefundDue('2026-12-18')).toBe('2026-12-29')
})
