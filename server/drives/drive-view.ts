import { storeStatus } from '#shared/deadline/store-status.ts'
import { localDay } from '#shared/deadline/wall-time.ts'
import type { DriveView } from '#shared/drives/contract.ts'
import { paceEstimate } from '#shared/pace/pace.ts'
import type { Deps } from '../deps.ts'
import { listDays, totalsBySeller } from '../orders/tallies.ts'
import { listGroups, listHouseSellers, listStudents } from '../sellers/queries.ts'
import { countNeeds, countWaiting, getDrive } from './queries.ts'

/** The organizer's overview, from the kept roll-ups; no line of any order is read. */
export function toDriveView(deps: Deps, driveId: number, role: string): DriveView {
  const { orm } = deps.db
  const { drive, organizationName, deliveryFrom, deliveryTo } = getDrive(orm, driveId)
  const bySeller = new Map(totalsBySeller(orm, driveId).map(row => [row.sellerId, row]))
  const students = listStudents(orm, driveId).map(student => ({
    ...student,
    items: bySeller.get(student.sellerId)?.items ?? 0,
    itemsCents: bySeller.get(student.sellerId)?.amountCents ?? 0,
  }))
  const houses = listHouseSellers(orm, driveId).map(house => ({
    ...house,
    items: bySeller.get(house.sellerId)?.items ?? 0,
    itemsCents: bySeller.get(house.sellerId)?.amountCents ?? 0,
  }))
  const days = listDays(orm, driveId)
  return {
    driveId: drive.publicId,
    name: drive.name,
    organization: organizationName,
    status: storeStatus({ ...drive, linkPaused: false, launched: drive.launchedAt !== null }, deps.now()),
    opensAt: new Date(drive.opensAt).toISOString(),
    closesAt: new Date(drive.closesAt).toISOString(),
    closedEarlyAt: drive.closedEarlyAt === null ? null : new Date(drive.closedEarlyAt).toISOString(),
    timeZone: drive.timeZone,
    turnInOn: drive.turnInOn,
    deliveryFrom,
    deliveryTo,
    role,
    totals: {
      orders: sum(days.map(day => day.orders)),
      items: sum([...bySeller.values()].map(row => row.items)),
      itemsCents: sum([...bySeller.values()].map(row => row.amountCents)),
      giftCents: sum(days.map(day => day.giftCents)),
      refundedCents: sum(days.map(day => day.refundedCents)),
      awaitingPayment: countWaiting(orm, driveId),
      sellers: students.length,
      sellersWithOrders: students.filter(student => student.items > 0).length,
    },
    pace: paceOf(drive, days, deps.now(), [...bySeller.values()]),
    goalCents: drive.goalCents,
    days: days.map(({ day, items, itemsCents }) => ({ day, items, itemsCents })),
    needs: countNeeds(orm, driveId),
    groups: listGroups(orm, driveId).map(group => {
      const members = students.filter(student => student.group === group.name)
      const own = houses.filter(house => house.kind === 'group' && house.group === group.name)
      return {
        name: group.name,
        sellers: members.length,
        items: sum([...members, ...own].map(row => row.items)),
        itemsCents: sum([...members, ...own].map(row => row.itemsCents)),
      }
    }),
    sellers: students.map(student => ({
      number: student.number ?? 0,
      name: `${student.firstName} ${student.lastName}`,
      group: student.group,
      items: student.items,
      itemsCents: student.itemsCents,
    })),
  }
}

/** Estimates of items and money, from the kept days of the drive. */
function paceOf(
  drive: { timeZone: string; opensAt: number; closesAt: number },
  days: ReturnType<typeof listDays>,
  now: number,
  bySeller: { items: number; amountCents: number }[],
) {
  const estimate = (of: 'items' | 'itemsCents', current: number) =>
    paceEstimate({
      byDay: new Map(days.map(day => [day.day, day[of]])),
      firstDay: localDay(drive.opensAt, drive.timeZone),
      today: localDay(now, drive.timeZone),
      lastDay: localDay(drive.closesAt - 60_000, drive.timeZone),
      current,
    })
  const items = estimate('items', sum(bySeller.map(row => row.items)))
  const itemsCents = estimate('itemsCents', sum(bySeller.map(row => row.amountCents)))
  return items === null || itemsCents === null || now >= drive.closesAt || now < drive.opensAt
    ? null
    : { items, itemsCents }
}

function sum(numbers: number[]): number {
  return numbers.reduce((total, n) => total + n, 0)
}
