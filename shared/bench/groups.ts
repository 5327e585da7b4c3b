/** How the calculators are arranged on the bench. */
export const benchGroups = ['dose', 'water', 'volume', 'exchange', 'body', 'units'] as const

export type BenchGroup = (typeof benchGroups)[number]
