import type { StoreView } from '#shared/stores/contract.ts'

/** Who gets the credit, as a customer is told: the seller, else the group, else the organization. */
export function creditOf(view: StoreView): string {
  return view.seller?.displayName ?? view.group?.name ?? view.organization.name
}
