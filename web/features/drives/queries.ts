import { queryOptions } from '@tanstack/react-query'
import type { DriveView } from '#shared/drives/contract.ts'
import { get, post } from '../../lib/api.ts'
import { apiPaths } from '../../paths.ts'

export const driveQuery = (driveId: string) =>
  queryOptions({
    queryKey: ['drive', driveId],
    queryFn: () => get<DriveView>(apiPaths.drive(driveId)),
    refetchInterval: 1_500,
  })

export const closeDrive = (driveId: string, reason: string) =>
  post<unknown>(apiPaths.closeDrive(driveId), { reason })

export const closeDriveAt = (driveId: string, body: { date: string; time: string; reason: string }) =>
  post<unknown>(apiPaths.closeDriveAt(driveId), body)
