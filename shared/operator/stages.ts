/** Stages of a drive, for the browser, which needs no schema for them. */
export const stages = ['set_up', 'not_open', 'selling', 'turn_in', 'awaiting_delivery', 'delivered'] as const
export type Stage = (typeof stages)[number]
