/** Addresses of the calls that the first screen makes, apart from their schemas, which it need not load. */
export const todayAddresses = {
  getToday: { id: 'getToday', method: 'get', path: '/today' },
  find: { id: 'find', method: 'get', path: '/find' },
} as const
