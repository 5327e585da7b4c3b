/** Readings that a rule may miss, as the message catalogue words them. */
export const readingNames = [
  'oxygen',
  'temperature',
  'pH',
  'alkalinity',
  'hardness',
  'free-copper',
  'total-copper',
  'total-ammonia',
  'nitrite',
] as const

export type ReadingName = (typeof readingNames)[number]
