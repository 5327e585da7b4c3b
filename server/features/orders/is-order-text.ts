import type { SignedOrder } from './order-content.ts'

const records = ['enclosure', 'water', 'volume', 'product', 'fields', 'amount']
const lists = ['valves', 'working', 'cautions', 'conditions', 'overrides', 'read']
const isRecord = (value: unknown): value is Record<string, unknown> =>
  typeof value === 'object' && value !== null && !Array.isArray(value)

/** Whether a content has the shape of a signed order. One that was changed by hand may be JSON and be none all the same. */
export function isOrderText(content: unknown): content is SignedOrder {
  if (!isRecord(content)) return false
  const { water } = content
  return (
    records.every((name) => isRecord(content[name])) &&
    lists.every((name) => Array.isArray(content[name])) &&
    isRecord(water) &&
    Array.isArray(water['animals'])
  )
}
