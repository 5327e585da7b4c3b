import { zodResolver } from '@hookform/resolvers/zod'
import type { FieldValues, Resolver } from 'react-hook-form'
import type { z } from 'zod'
import type { BodyOf, Contract } from '../../shared/contracts/contract.ts'

/** A contract's own schema as the rule of a form, so that form and server refuse the same things in the same words. */
export function resolverOf<C extends Contract>(of: C): Resolver<BodyOf<C> & FieldValues> {
  if (!of.body) throw new Error(`${of.id} has no body`)
  const schema = of.body as z.ZodType<FieldValues, FieldValues>
  return zodResolver(schema) as unknown as Resolver<BodyOf<C> & FieldValues>
}
