/**
 * Addresses of the calls that the frame of the client makes before any sheet is open. They stand apart from their
 * schemas so that the first screen does not have to load those; the contracts take them from here.
 */
export const signInAddresses = {
  signIn: { id: 'signIn', method: 'post', path: '/sign-in' },
  signOut: { id: 'signOut', method: 'post', path: '/sign-out' },
  getMe: { id: 'getMe', method: 'get', path: '/me' },
  setPreference: { id: 'setPreference', method: 'put', path: '/me/preferences/:name' },
} as const
