import type { z } from 'zod'
import type { Action } from '../domain/permissions/table.ts'
import type { ProblemCode } from './problems.ts'
import './input-words.ts'

type Method = 'get' | 'post' | 'put' | 'delete'

/** `public` is for anybody; `signed-in` for anybody who signed in, whatever the role. */
export type Gate = Action | 'public' | 'signed-in'

/**
 * What may cross the wire at one address, said once: the server parses and guards by it, the client calls by it,
 * the forms resolve by it, and the API documents are made from it.
 */
export interface Contract<
  P extends z.ZodType = z.ZodType,
  Q extends z.ZodType = z.ZodType,
  B extends z.ZodType = z.ZodType,
  R extends z.ZodType = z.ZodType,
> {
  /** verbNoun, unique */
  id: string
  method: Method
  /** Below /api, with Express parameters: `/people/:id` */
  path: string
  action: Gate
  summary: string
  params?: P
  query?: Q
  body?: B
  /** One success status and its schema. */
  reply: Partial<Record<200 | 201 | 202 | 204, R>>
  problems: readonly ProblemCode[]
  /**
   * `by-record-id`: the body carries the new record's own UUIDv7, for ever the key.
   * `by-key`: a command, sent with an Idempotency-Key header.
   * `nothing-kept`: a question with a body; it changes nothing.
   */
  idempotent?: 'by-key' | 'by-record-id' | 'nothing-kept'
  produces?: 'json' | 'csv' | 'pdf' | 'stream' | 'html'
  consumes?: 'json' | 'multipart'
}

/** Makes a contract; keeps the exact types of its schemas. Any record may be sent again with other content. */
export function contract<P extends z.ZodType, Q extends z.ZodType, B extends z.ZodType, R extends z.ZodType>(
  description: Contract<P, Q, B, R>,
): Contract<P, Q, B, R> {
  const { idempotent, problems } = description
  if (idempotent !== 'by-record-id' || problems.includes('id-already-used')) return description
  return { ...description, problems: [...problems, 'id-already-used'] }
}

// A schema that a contract does not state infers as `unknown`: nothing can be read from it by mistake.
export type ParamsOf<C> = C extends Contract<infer P, z.ZodType, z.ZodType, z.ZodType> ? z.infer<P> : never
export type QueryOf<C> = C extends Contract<z.ZodType, infer Q, z.ZodType, z.ZodType> ? z.infer<Q> : never
export type BodyOf<C> = C extends Contract<z.ZodType, z.ZodType, infer B, z.ZodType> ? z.infer<B> : never
export type ReplyOf<C> = C extends Contract<z.ZodType, z.ZodType, z.ZodType, infer R> ? z.infer<R> : never

/** The one success status of a contract. */
export function successStatus(of: Contract): number {
  const [status] = Object.keys(of.reply)
  return Number(status)
}
