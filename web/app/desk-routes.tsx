import type { ComponentType } from 'react'
import type { RouteObject } from 'react-router-dom'
import { BrokenPage, NotFoundPage } from '../routes/not-found-page.tsx'

/** A page that is fetched when somebody goes there. */
function lazyPage<Name extends string>(load: () => Promise<Record<Name, ComponentType>>, name: Name) {
  return async () => ({ Component: (await load())[name] })
}

/** The desks and the doors to them. */
export const deskRoutes: RouteObject[] = [
  {
    ErrorBoundary: BrokenPage,
    children: [
      { path: '/', lazy: lazyPage(() => import('../routes/account/home-page.tsx'), 'HomePage') },
      { path: '/sign-in', lazy: lazyPage(() => import('../routes/account/sign-in-page.tsx'), 'SignInPage') },
      {
        path: '/sign-in/link',
        lazy: lazyPage(() => import('../routes/account/use-link-page.tsx'), 'UseLinkPage'),
      },
      {
        path: '/forgot-password',
        lazy: lazyPage(() => import('../routes/account/forgot-password-page.tsx'), 'ForgotPasswordPage'),
      },
      {
        path: '/reset-password',
        lazy: lazyPage(() => import('../routes/account/reset-password-page.tsx'), 'ResetPasswordPage'),
      },
      {
        path: '/account/second-factor',
        lazy: lazyPage(() => import('../routes/account/second-factor-page.tsx'), 'SecondFactorPage'),
      },
      { path: '/family', lazy: lazyPage(() => import('../routes/family/family-page.tsx'), 'FamilyPage') },
      {
        path: '/family/sellers/:sellerId',
        lazy: lazyPage(() => import('../routes/family/seller-page.tsx'), 'SellerPage'),
      },
      {
        path: '/organizer/:driveId',
        lazy: lazyPage(() => import('../routes/organizer/drive-page.tsx'), 'DrivePage'),
      },
      {
        path: '/organizer/:driveId/orders',
        lazy: lazyPage(() => import('../routes/organizer/orders-page.tsx'), 'OrdersPage'),
      },
      {
        path: '/organizer/:driveId/orders/:orderId',
        lazy: lazyPage(() => import('../routes/organizer/order-page.tsx'), 'OrderPage'),
      },
      {
        path: '/operator',
        lazy: lazyPage(() => import('../routes/operator/operator-page.tsx'), 'OperatorPage'),
      },
      { path: '*', Component: NotFoundPage },
    ],
  },
]
