import type { Request, Response } from 'express'
import type { Readable } from 'node:stream'
import type { BodyOf, Contract, ParamsOf, QueryOf, ReplyOf } from '../../../shared/contracts/contract.ts'
import type { RequestContext } from './request-context.ts'

/** A reply that is not JSON: a document or a stream. */
export interface FileReply {
  contentType: string
  /** Offered name; also decides that the browser saves it. Absent: shown in place. */
  fileName?: string
  body: Uint8Array | Readable
}

/** What a handler gets: everything already parsed by the contract, and who asks. */
export interface Call<C extends Contract> {
  params: ParamsOf<C>
  query: QueryOf<C>
  body: BodyOf<C>
  context: RequestContext
  /** For the few routes that deal in cookies, sessions or uploads. */
  req: Request
  res: Response
}

type Answer<C extends Contract> = C['produces'] extends 'csv' | 'pdf' | 'stream' | 'html'
  ? FileReply
  : ReplyOf<C> | FileReply

export interface Route {
  contract: Contract
  handle(call: Call<Contract>): Promise<unknown>
}

/** Binds a handler to its contract. */
export function route<C extends Contract>(of: C, handle: (call: Call<C>) => Promise<Answer<C>>): Route {
  return { contract: of, handle: handle as unknown as Route['handle'] }
}
