/**
 * What can be done with a piece of work where it stands.
 *
 * - `mark-seen`   say that one has seen an urgent call and sees to it
 * - `mark-read`   say that one has read an observation marked for the veterinarian
 * - `lift-order`  lift the hold of an order, with a reason
 * - `lift-case`   lift a lock of a case, with a reason
 * - `stop-bath`   end a bath at once
 */
export const todayActs = ['mark-seen', 'mark-read', 'lift-order', 'lift-case', 'stop-bath'] as const
export type TodayAct = (typeof todayActs)[number]
