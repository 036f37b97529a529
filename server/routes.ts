import { orderRoutes } from './drives/order-routes.ts'
import { driveRoutes } from './drives/routes.ts'
import { familyRoutes } from './families/routes.ts'
import type { AnyRoute } from './http/route.ts'
import { operatorRoutes } from './operator/routes.ts'
import { receiptRoutes } from './orders/routes.ts'
import { paymentRoutes } from './payments/routes.ts'
import { peopleRoutes } from './people/routes.ts'
import { secondFactorRoutes } from './people/second-factor-routes.ts'
import { teamRoutes } from './people/team-routes.ts'
import { sellerRoutes } from './sellers/routes.ts'
import { storeRoutes } from './stores/routes.ts'

/** Every route below /api: what the server mounts, publishes and tests access of. */
export const routes: readonly AnyRoute[] = [
  ...storeRoutes,
  ...receiptRoutes,
  ...paymentRoutes,
  ...peopleRoutes,
  ...secondFactorRoutes,
  ...teamRoutes,
  ...sellerRoutes,
  ...familyRoutes,
  ...driveRoutes,
  ...orderRoutes,
  ...operatorRoutes,
]
