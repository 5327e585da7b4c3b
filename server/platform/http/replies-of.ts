import type { Contract } from '../../../shared/contracts/contract.ts'
import type { ProblemCode } from '../../../shared/contracts/problems.ts'

/** What a reply is sent as. */
export const mediaTypes = {
  json: 'application/json',
  csv: 'text/csv',
  pdf: 'application/pdf',
  html: 'text/html',
  stream: 'application/octet-stream',
} as const

/** Every refusal that an address can give: its own, and those of the guard and of the parser in front of it. */
export function refusalsOf(of: Contract): ProblemCode[] {
  const guard = of.action === 'public' ? [] : (['not-signed-in', 'may-not'] as const)
  const parser = of.params || of.query || of.body ? (['bad-input'] as const) : []
  return [...new Set<ProblemCode>([...guard, ...parser, ...of.problems])]
}
