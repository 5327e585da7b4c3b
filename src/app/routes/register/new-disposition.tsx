import { NewTransaction } from './new-transaction.tsx'

/** Animals leave. */
export function Component() {
  return <NewTransaction way="out" />
}
