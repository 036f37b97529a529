import { compileMessage } from '@lingui/message-utils/compileMessage'

/** Compiles a catalog of ICU messages; done at build time for the browser, at load time on the server. */
export function compileCatalog(messages: Record<string, string>) {
  return Object.fromEntries(Object.entries(messages).map(([key, message]) => [key, compileMessage(message)]))
}
