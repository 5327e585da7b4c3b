// breaks: domain-below-contracts: shared/domain does not import shared/contracts
export { thing as thing4 } from '../contracts/thing.contract.ts'
// breaks: domain-knows-itself
import 'zod'
// breaks: domain-knows-itself
import 'node:crypto'
