import { NewTransaction } from './new-transaction.tsx'

/** Animals come. */
export function Component() {
  return <NewTransaction way="in" />
}
