/** A message catalog, compiled at build time. */
declare module '*.json?compiled' {
  import type { Messages } from '@lingui/core'

  const messages: Messages
  export default messages
}
