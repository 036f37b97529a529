import { queryOptions } from '@tanstack/react-query'
import type { NewSecondFactor, RecoveryCodes, SecondFactor, Team } from '#shared/people/second-factor.ts'
import { get, post } from '../../lib/api.ts'
import { apiPaths } from '../../paths.ts'

export const secondFactorQuery = queryOptions({
  queryKey: ['second-factor'],
  queryFn: () => get<SecondFactor>(apiPaths.secondFactor),
})
export const beginSecondFactor = (password: string) =>
  post<NewSecondFactor>(apiPaths.secondFactor, { password })
export const proveSecondFactor = (code: string) => post<RecoveryCodes>(apiPaths.proveSecondFactor, { code })
export const renewRecoveryCodes = (password: string) =>
  post<RecoveryCodes>(apiPaths.renewRecoveryCodes, { password })

export const teamQuery = (driveId: string) =>
  queryOptions({ queryKey: ['drive', driveId, 'team'], queryFn: () => get<Team>(apiPaths.team(driveId)) })
export const resetMemberFactor = (driveId: string, userId: string, reason: string) =>
  post<unknown>(apiPaths.resetMemberFactor(driveId, userId), { reason })
