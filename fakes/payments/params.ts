import { invalidRequest } from './api-error.ts'

/**
 * The parameters of one API call, read one by one. Whatever nobody read is refused at the end, as the payment
 * service refuses parameters it does not know.
 */
export type Params = {
  text(name: string, rule?: { max?: number }): string | null
  requiredText(name: string, rule?: { max?: number }): string
  integer(name: string, rule?: { min?: number; max?: number }): number | null
  oneOf(name: string, allowed: readonly string[]): string | null
  flag(name: string): boolean | null
  url(name: string): string | null
  list(name: string): string[]
  metadata(name: string): Record<string, string>
  /** The parameters below a name: `within('price_data').text('currency')` reads `price_data[currency]`. */
  within(name: string): Params
  items(name: string): Params[]
  has(name: string): boolean
  refuseUnread(): void
  /** The full name of a parameter, for an error message. */
  nameOf(name: string): string
}

/** Reads a form-encoded body or query with bracket keys, such as `line_items[0][quantity]=2`. */
export function readParams(encoded: string): Params {
  const values = new Map<string, string>()
  for (const [key, value] of new URLSearchParams(encoded)) values.set(key, value)
  const read = new Set<string>()
  return paramsBelow('', values, read)
}

function paramsBelow(prefix: string, values: Map<string, string>, read: Set<string>): Params {
  const nameOf = (name: string) => (prefix === '' ? name : `${prefix}[${name}]`)
  const keysBelow = (name: string) => [...values.keys()].filter(key => key.startsWith(`${nameOf(name)}[`))
  const take = (name: string) => {
    const full = nameOf(name)
    read.add(full)
    return values.get(full) ?? null
  }

  const params: Params = {
    nameOf,
    has: name => values.has(nameOf(name)) || keysBelow(name).length > 0,
    text(name, rule = {}) {
      const value = take(name)
      const param = nameOf(name)
      if (value === '')
        throw invalidRequest(`You passed an empty string for '${param}'.`, {
          code: 'parameter_invalid_empty',
          param,
        })
      if (value !== null && value.length > (rule.max ?? 5_000))
        throw invalidRequest(`Invalid string: '${param}' must be at most ${rule.max ?? 5_000} characters`, {
          param,
        })
      return value
    },
    requiredText(name, rule) {
      const value = params.text(name, rule)
      const param = nameOf(name)
      if (value === null)
        throw invalidRequest(`Missing required param: ${param}.`, { code: 'parameter_missing', param })
      return value
    },
    integer(name, rule = {}) {
      const value = take(name)
      const param = nameOf(name)
      if (value === null) return null
      const number = /^-?\d{1,15}$/.test(value) ? Number(value) : Number.NaN
      if (Number.isNaN(number))
        throw invalidRequest(`Invalid integer: ${value}`, { code: 'parameter_invalid_integer', param })
      if (number < (rule.min ?? Number.MIN_SAFE_INTEGER))
        throw invalidRequest(`This value must be greater than or equal to ${rule.min}.`, {
          code: 'parameter_invalid_integer',
          param,
        })
      if (number > (rule.max ?? Number.MAX_SAFE_INTEGER))
        throw invalidRequest(`This value must be less than or equal to ${rule.max}.`, {
          code: 'parameter_invalid_integer',
          param,
        })
      return number
    },
    oneOf(name, allowed) {
      const value = take(name)
      const param = nameOf(name)
      if (value !== null && !allowed.includes(value))
        throw invalidRequest(`Invalid ${param}: must be one of ${allowed.join(', ')}`, { param })
      return value
    },
    flag(name) {
      const value = params.oneOf(name, ['true', 'false'])
      return value === null ? null : value === 'true'
    },
    url(name) {
      const value = params.text(name)
      const param = nameOf(name)
      if (value !== null && !isWebAddress(value))
        throw invalidRequest('Not a valid URL', { code: 'url_invalid', param })
      return value
    },
    list(name) {
      return keysBelow(name).map(key => {
        read.add(key)
        return values.get(key)!
      })
    },
    metadata(name) {
      const entries = keysBelow(name).map(key => {
        read.add(key)
        return [key.slice(nameOf(name).length + 1, -1), values.get(key)!] as const
      })
      const param = nameOf(name)
      // The payment service's limits: 50 keys, names to 40 characters, values to 500.
      if (entries.length > 50) throw invalidRequest('Metadata can have at most 50 keys.', { param })
      for (const [key, value] of entries) {
        if (key.length === 0 || key.length > 40 || /[[\]]/.test(key))
          throw invalidRequest(`Metadata keys can be up to 40 characters long and hold no brackets: ${key}`, {
            param,
          })
        if (value.length > 500)
          throw invalidRequest(`Metadata values can have up to 500 characters. ${key} has ${value.length}.`, {
            param: `${param}[${key}]`,
          })
      }
      return Object.fromEntries(entries.filter(([, value]) => value !== ''))
    },
    within: name => paramsBelow(nameOf(name), values, read),
    items(name) {
      const start = nameOf(name).length + 1
      const places = new Set(keysBelow(name).map(key => key.slice(start, key.indexOf(']', start))))
      return [...places].map(place => paramsBelow(`${nameOf(name)}[${place}]`, values, read))
    },
    refuseUnread() {
      for (const param of values.keys()) {
        if (!read.has(param))
          throw invalidRequest(`Received unknown parameter: ${param}`, { code: 'parameter_unknown', param })
      }
    },
  }
  return params
}

function isWebAddress(text: string): boolean {
  try {
    return ['http:', 'https:'].includes(new URL(text).protocol)
  } catch {
    return false
  }
}
