/** Addresses of the calls that the first screen makes, apart from their schemas, which it need not load. */
export const todayAddresses = {
  getToday: { id: 'getToday', method: 'get', path: '/today' },
  find: { id: 'find', method: 'get', path: '/find' },
} as const

/** Addresses of what can be done on Today itself; the contracts take them from here. */
export const actAddresses = {
  noteSeen: { id: 'noteSeen', method: 'post', path: '/notices/:id/seen', idempotent: 'by-record-id' },
  reviewObservation: {
    id: 'reviewObservation',
    method: 'post',
    path: '/observations/:id/reviews',
    idempotent: 'by-record-id',
  },
  liftOrderHold: {
    id: 'liftOrderHold',
    method: 'post',
    path: '/orders/:number/hold-lift',
    idempotent: 'by-key',
  },
  writeHandover: {
    id: 'writeHandover',
    method: 'post',
    path: '/handover-notes',
    idempotent: 'by-record-id',
  },
  noteHandoverRead: {
    id: 'noteHandoverRead',
    method: 'post',
    path: '/handover-notes/:id/reads',
    idempotent: 'by-record-id',
  },
  holdOrder: { id: 'holdOrder', method: 'post', path: '/orders/:number/holds', idempotent: 'by-record-id' },
  stopBath: { id: 'stopBath', method: 'post', path: '/doses/:doseId/stop', idempotent: 'by-record-id' },
} as const
