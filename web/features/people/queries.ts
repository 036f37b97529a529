import { queryOptions } from '@tanstack/react-query'
import type { Me } from '#shared/people/contract.ts'
import { get, post } from '../../lib/api.ts'
import { apiPaths } from '../../paths.ts'

export const meQuery = queryOptions({ queryKey: ['me'], queryFn: () => get<Me>(apiPaths.me) })

/** `twoFactorRedirect`: the password fits, and a code is asked for before there is a session. */
export const signIn = (body: { email: string; password: string }) =>
  post<{ twoFactorRedirect?: boolean }>(apiPaths.signIn, body)
export const verifyCode = (code: string) => post<unknown>(apiPaths.verifyCode, { code })
export const verifyRecoveryCode = (code: string) => post<unknown>(apiPaths.verifyRecoveryCode, { code })
export const requestLink = (email: string) => post<unknown>(apiPaths.requestLink, { email })
export const signInByLink = (token: string) => post<unknown>(apiPaths.useLink, { token })
export const requestReset = (email: string) => post<unknown>(apiPaths.requestReset, { email })
export const resetPassword = (body: { token: string; newPassword: string }) =>
  post<unknown>(apiPaths.resetPassword, body)
export const signOut = () => post<unknown>(apiPaths.signOut, {})
export const signOutEverywhere = () => post<unknown>(apiPaths.signOutEverywhere, {})
