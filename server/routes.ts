import { driveRoutes } from './drives/routes.ts'
import type { AnyRoute } from './http/route.ts'
import { receiptRoutes } from './orders/routes.ts'
import { paymentRoutes } from './payments/routes.ts'
import { peopleRoutes } from './people/routes.ts'
import { sellerRoutes } from './sellers/routes.ts'
import { storeRoutes } from './stores/routes.ts'

/** Every route below /api: what the server mounts, publishes and tests access of. */
export const routes: readonly AnyRoute[] = [
  ...storeRoutes,
  ...receiptRoutes,
  ...paymentRoutes,
  ...peopleRoutes,
  ...sellerRoutes,
  ...driveRoutes,
]
