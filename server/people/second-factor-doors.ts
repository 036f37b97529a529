import { symmetricDecrypt, symmetricEncrypt } from 'better-auth/crypto'
import { fromNodeHeaders } from 'better-auth/node'
import type { Request } from 'express'
import { withoutCookies } from './request-cookies.ts'

/** What of the sign-in library the second factor needs. */
type Library = {
  $context: Promise<{ secretConfig: Parameters<typeof symmetricEncrypt>[0]['key'] }>
  api: {
    enableTwoFactor(call: Call<{ password: string; method: 'totp' }>): Promise<Response>
    verifyTOTP(call: Call<{ code: string }>): Promise<Response>
    generateBackupCodes(call: Call<{ password: string }>): Promise<Response>
    viewBackupCodes(call: { body: { userId: string } }): Promise<{ backupCodes: string[] }>
  }
}
type Call<B> = { body: B; headers: Headers; asResponse: true }

export type SecondFactorDoors = ReturnType<typeof secondFactorDoors>

/** The second factor's part of identity: set up, prove, print new recovery codes. */
export function secondFactorDoors(library: Library) {
  // A sign-in as somebody else, begun in this browser and left half done, has no say here.
  const headersOf = (req: Request) => {
    const headers = fromNodeHeaders(req.headers)
    headers.set('cookie', withoutCookies(req.headers.cookie, ['two_factor']))
    return headers
  }
  const key = async () => (await library.$context).secretConfig

  return {
    /** Makes a new secret, not yet proven. Its address for authenticator apps; null when the password is wrong. */
    async begin(req: Request, password: string): Promise<string | null> {
      const answer = await library.api.enableTwoFactor({
        body: { password, method: 'totp' },
        headers: headersOf(req),
        asResponse: true,
      })
      return answer.ok ? ((await answer.json()) as { totpURI: string }).totpURI : null
    },

    /** Proves a new secret by a code, in exchange for a new session; null when the code is not its own. */
    async prove(req: Request, code: string): Promise<{ cookies: string[]; sessionToken: string } | null> {
      const answer = await library.api.verifyTOTP({
        body: { code },
        headers: headersOf(req),
        asResponse: true,
      })
      const cookies = answer.headers.getSetCookie()
      const token = cookies.map(cookie => /session_token=([^.;]+)/.exec(cookie)?.[1]).find(Boolean)
      return answer.ok && token ? { cookies, sessionToken: decodeURIComponent(token) } : null
    },

    /** Makes new recovery codes, which end the old ones; null when the password is wrong. */
    async renewRecoveryCodes(req: Request, password: string): Promise<string[] | null> {
      const answer = await library.api.generateBackupCodes({
        body: { password },
        headers: headersOf(req),
        asResponse: true,
      })
      return answer.ok ? ((await answer.json()) as { backupCodes: string[] }).backupCodes : null
    },

    /** The recovery codes that are left. */
    async listRecoveryCodes(userId: string): Promise<string[]> {
      return (await library.api.viewBackupCodes({ body: { userId } })).backupCodes
    },

    /** Seals a secret or a list of codes as it is kept, and opens it again. */
    seal: async (text: string): Promise<string> => symmetricEncrypt({ key: await key(), data: text }),
    open: async (sealed: string): Promise<string> => symmetricDecrypt({ key: await key(), data: sealed }),
  }
}
