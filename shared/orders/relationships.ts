/** How a customer knows the seller; asked so that a family can tell a stranger. */
export const relationshipNames = [
  'parent',
  'grandparent',
  'relative',
  'neighbor',
  'friend',
  'coworker',
  'school_staff',
  'other',
] as const
