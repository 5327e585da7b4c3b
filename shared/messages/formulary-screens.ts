import { defineMessages } from './define-messages.ts'

/** Words of the formulary: dose lines, products and their lots. */
export const formularyWords = defineMessages({
  to: 'to',
  upTo: (p: { amount: string }) => `up to ${p.amount}`,
})

/** Whether a lot may be used today, and if not why. */
export const lotStateNames = defineMessages({
  usable: 'may be used',
  expired: 'expired',
  recalled: 'recalled',
  'set-aside': 'set aside',
  'stored-cold': 'was kept too cold',
  precipitate: 'shows a precipitate',
  'used-up': 'used up',
})
