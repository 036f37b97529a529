/** Every address of ours, built here and nowhere else. */
export const paths = {
  home: '/',
  store: (token: string) => `/s/${token}`,
  receipt: (id: string) => `/r/${id}`,
  signIn: '/sign-in',
  signInLink: '/sign-in/link',
  forgotPassword: '/forgot-password',
  resetPassword: '/reset-password',
  family: '/family',
  familySeller: (sellerId: string) => `/family/sellers/${sellerId}`,
  organizer: (driveId: string) => `/organizer/${driveId}`,
  operator: '/operator',
}

export const apiPaths = {
  store: (token: string) => `/api/stores/${token}`,
  orders: (token: string) => `/api/stores/${token}/orders`,
  receipt: (id: string) => `/api/receipts/${id}`,
  checkReceipt: (id: string) => `/api/receipts/${id}/check`,
  me: '/api/me',
  signIn: '/api/auth/sign-in/email',
  requestLink: '/api/auth/sign-in/magic-link',
  useLink: '/api/sign-in/link',
  requestReset: '/api/auth/request-password-reset',
  resetPassword: '/api/auth/reset-password',
  signOut: '/api/auth/sign-out',
  signOutEverywhere: '/api/sign-out-everywhere',
  seller: (sellerId: string) => `/api/sellers/${sellerId}`,
  drive: (driveId: string) => `/api/drives/${driveId}`,
  closeDrive: (driveId: string) => `/api/drives/${driveId}/close`,
}
