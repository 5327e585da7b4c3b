import type { Request, RequestHandler, Response, Router } from 'express'
import { Readable } from 'node:stream'
import { pipeline } from 'node:stream/promises'
import type { z } from 'zod'
import { canonicalJson } from '../../../shared/domain/canonical-json.ts'
import type { Json } from '../../../shared/domain/canonical-json.ts'
import { successStatus } from '../../../shared/contracts/contract.ts'
import type { Contract } from '../../../shared/contracts/contract.ts'
import { personHeader } from '../../../shared/contracts/person-header.ts'
import { bodyHashOf, hashOf } from '../database/transactions.ts'
import { checkGate, checkWriter } from './guard.ts'
import type { SignedIn } from './guard.ts'
import { Problem } from './problem.ts'
import { installation } from './request-context.ts'
import type { RecordRequest, RequestContext } from './request-context.ts'
import { requestIdOf } from './request-id.ts'
import { readJson } from './read-json.ts'
import type { FileReply, Route } from './route.ts'
import { fieldProblems } from './field-problems.ts'
import { findUnwritableText } from './unwritable-text.ts'

/** Called when somebody was refused by the permission table. */
export type OnRefusal = (contract: Contract, person: SignedIn, requestId: string) => Promise<void>

export interface RouteTools {
  personOf(req: Request): SignedIn | null
  onRefusal: OnRefusal
}

function guard(of: Contract, tools: RouteTools): RequestHandler {
  return async (req, _res, next) => {
    const person = tools.personOf(req)
    if (of.action !== 'public') checkWriter(of, person, req.get(personHeader))
    try {
      checkGate(of, person)
    } catch (error) {
      if (person && error instanceof Problem && error.code === 'may-not')
        await tools.onRefusal(of, person, requestIdOf(req))
      throw error
    }
    next()
  }
}

function parsePart(schema: z.ZodType | undefined, value: unknown, root: string) {
  if (!schema) return { value: undefined, errors: [] }
  const unwritable = findUnwritableText(value, root)
  if (unwritable.length > 0) return { value: undefined, errors: unwritable }
  const parsed = schema.safeParse(value)
  return parsed.success
    ? { value: parsed.data, errors: [] }
    : { value: undefined, errors: fieldProblems(parsed.error, value, root) }
}

/** Parses every part and reports all that is wrong at once. */
function parseCall(of: Contract, req: Request) {
  const params = parsePart(of.params, req.params, '/params')
  const query = parsePart(of.query, req.query, '/query')
  const body =
    of.consumes === 'multipart' ? { value: undefined, errors: [] } : parsePart(of.body, req.body, '')
  const errors = [...params.errors, ...query.errors, ...body.errors]
  if (errors.length > 0)
    throw new Problem('bad-input', {
      errors,
      detail: errors
        .map((e) => e.detail)
        .slice(0, 3)
        .join(' · '),
    })
  return { params: params.value, query: query.value, body: body.value }
}

/**
 * The record that a request carries, with a hash of what was sent for it. How it came is no part of the content: an
 * entry that is sent again from an outbox is the same entry. A file is compared by its own hash where it is stored.
 */
function recordOf(of: Contract, req: Request): RecordRequest | null {
  const body: unknown = req.body
  if (typeof body !== 'object' || body === null || !('id' in body) || typeof body.id !== 'string') return null
  const { origin: _, ...content } = body as Record<string, Json>
  const contentHash = hashOf(canonicalJson({ params: req.params as Json, content }))
  return { id: body.id, contractId: of.id, contentHash }
}

function contextOf(of: Contract, req: Request, person: SignedIn | null, content: unknown): RequestContext {
  const context: RequestContext = { actor: person ?? installation, requestId: requestIdOf(req) }
  if (of.idempotent === 'by-record-id') {
    const record = recordOf(of, req)
    return record ? { ...context, record } : context
  }
  if (of.idempotent !== 'by-key') return context
  const key = req.get('idempotency-key')
  if (!key || key.length > 100)
    throw new Problem('idempotency-key-missing', {
      detail: 'Send a new UUID with each command, the same one on a retry.',
    })
  return { ...context, command: { key, contractId: of.id, bodyHash: bodyHashOf(content) } }
}

const isFile = (reply: unknown): reply is FileReply =>
  typeof reply === 'object' && reply !== null && 'contentType' in reply && 'body' in reply

async function sendFile(res: Response, reply: FileReply): Promise<void> {
  res.setHeader('Content-Type', reply.contentType)
  res.setHeader('Cache-Control', 'private, no-store')
  if (reply.fileName) res.attachment(reply.fileName)
  // attachment() guesses a type from the name; ours stands
  res.setHeader('Content-Type', reply.contentType)
  if (reply.body instanceof Readable) await pipeline(reply.body, res)
  else res.end(Buffer.from(reply.body))
}

/** Mounts one feature's routes: guard, then parsing, then the handler, then the contract's reply and nothing more. */
export function mountRoutes(router: Router, routes: readonly Route[], tools: RouteTools): void {
  for (const { contract: of, handle } of routes) {
    const [status] = [successStatus(of)]
    const schema = Object.values(of.reply)[0]
    const steps: RequestHandler[] = [guard(of, tools)]
    if (of.body && of.consumes !== 'multipart') steps.push(readJson)
    router[of.method](of.path, ...steps, async (req: Request, res: Response) => {
      const person = tools.personOf(req)
      const content = parseCall(of, req)
      const context = contextOf(of, req, person, content)
      const reply = await handle({ ...content, context, req, res })
      if (isFile(reply)) return sendFile(res, reply)
      if (status === 204) return void res.status(204).end()
      res.status(status).json(schema ? schema.parse(reply) : reply)
    })
  }
}
