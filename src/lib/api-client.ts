import type { BodyOf, Contract, ParamsOf, QueryOf, ReplyOf } from '../../shared/contracts/contract.ts'
import type { ProblemBody } from '../../shared/contracts/problems.ts'
import { personHeader } from '../../shared/contracts/person-header.ts'
import { clientWords } from '../../shared/messages/client.ts'
import { pagePerson } from './page-person.ts'
import { ProblemError } from './problem-error.ts'

interface Call {
  params?: Readonly<Record<string, string | number>> | undefined
  query?: Readonly<Record<string, unknown>> | undefined
  body?: unknown
  /** The key under which a command is repeated: made once for an attempt by a person and kept across retries. */
  key?: string | undefined
  signal?: AbortSignal | undefined
  /** How long to wait for an answer. */
  patienceMs?: number | undefined
  /** Who wrote it, where that was another time than now: an entry that waited on the device. */
  writtenBy?: string | undefined
}

type WithParams<P> = unknown extends P ? { params?: undefined } : { params: P }
type WithQuery<Q> = unknown extends Q
  ? { query?: undefined }
  : { query?: { [K in keyof Q]?: Q[K] | undefined } }
type WithBody<B> = unknown extends B ? { body?: undefined } : { body: B | FormData }

/** Options of a call, typed by its contract: what it states must be given, what it does not state cannot. */
export type CallOptions<C extends Contract> = Pick<Call, 'signal' | 'patienceMs' | 'key' | 'writtenBy'> &
  WithParams<ParamsOf<C>> &
  WithQuery<QueryOf<C>> &
  WithBody<BodyOf<C>>

const usualPatienceMs = 10_000

/** As much of a contract as a call needs at run time. */
export type Address = Pick<Contract, 'id' | 'method' | 'path' | 'idempotent'>

/**
 * Calls the server at the address of a contract and gives its reply, typed by it. With the contract named as a type
 * (`api<typeof getMe>(address, …)`) only its address has to be loaded.
 *
 * @throws ProblemError for every refusal, and when nobody answers; nothing else
 */
export function api<C extends Contract>(of: C, call: CallOptions<C>): Promise<ReplyOf<C>>
export function api<C extends Contract>(of: Address, call: CallOptions<C>): Promise<ReplyOf<C>>
export async function api<C extends Contract>(of: Address, call: CallOptions<C>): Promise<ReplyOf<C>> {
  const response = await send(of, call as Call)
  if (response.status === 204) return null as ReplyOf<C>
  try {
    return (await response.json()) as ReplyOf<C>
  } catch {
    throw notUnderstood(response.status)
  }
}

/** A file that a contract produces (PDF, CSV, JSON to keep), with the name that the server gave it. */
export async function apiFile<C extends Contract>(
  of: C,
  call: CallOptions<C>,
): Promise<{ blob: Blob; name: string | null }> {
  const response = await send(of, call as Call)
  const name = /filename="?([^";]+)"?/.exec(response.headers.get('content-disposition') ?? '')?.[1] ?? null
  return { blob: await response.blob(), name }
}

async function send(of: Address, call: Call): Promise<Response> {
  const patience = AbortSignal.timeout(call.patienceMs ?? usualPatienceMs)
  const headers: Record<string, string> = { accept: 'application/json, application/problem+json, */*' }
  if (of.idempotent === 'by-key' && call.key === undefined) throw new Error(`${of.id} needs a key`)
  if (call.key !== undefined) headers['idempotency-key'] = call.key
  const writtenBy = of.method === 'get' ? null : (call.writtenBy ?? pagePerson.now().id)
  if (writtenBy !== null) headers[personHeader] = writtenBy
  const multipart = call.body instanceof FormData
  if (call.body !== undefined && !multipart) headers['content-type'] = 'application/json'
  let response: Response
  try {
    response = await fetch(addressOf(of, call.params, call.query), {
      method: of.method.toUpperCase(),
      headers,
      credentials: 'same-origin',
      signal: call.signal ? AbortSignal.any([call.signal, patience]) : patience,
      ...(call.body === undefined
        ? {}
        : { body: multipart ? (call.body as FormData) : JSON.stringify(call.body) }),
    })
  } catch (error) {
    // the caller has gone away; that is no failure to speak of
    if (call.signal?.aborted) throw error
    const slow = patience.aborted
    throw new ProblemError(
      0,
      'no-answer',
      slow ? clientWords.tooSlow : clientWords.noAnswer,
      clientWords.noAnswerDetail,
      [],
      undefined,
      {},
    )
  }
  if (response.ok) return response
  const problem = await problemOf(response)
  if (problem.code === 'different-person') pagePerson.differs(String(problem.body['signed_in']))
  if (problem.code === 'not-signed-in') pagePerson.sessionEnded()
  throw problem
}

async function problemOf(response: Response): Promise<ProblemError> {
  const body: unknown = await response.json().catch(() => null)
  return isProblemBody(body) ? ProblemError.fromBody(response.status, body) : notUnderstood(response.status)
}

function isProblemBody(body: unknown): body is ProblemBody {
  return typeof body === 'object' && body !== null && 'code' in body && 'title' in body
}

function notUnderstood(status: number): ProblemError {
  return new ProblemError(
    status,
    'not-understood',
    clientWords.notUnderstood,
    clientWords.notUnderstoodDetail,
    [],
    undefined,
    {},
  )
}

/** The address of a call: parameters put in and encoded, the query in the order given, empty parts left out. */
export function addressOf(
  of: Pick<Contract, 'path'>,
  params: Call['params'] = {},
  query: Call['query'] = {},
): string {
  const path = of.path.replace(/:(\w+)/g, (_, name: string) => {
    const value = params[name]
    if (value === undefined) throw new Error(`${of.path} needs ${name}`)
    return encodeURIComponent(String(value))
  })
  const pairs = Object.entries(query).filter(
    ([, value]) => value !== undefined && value !== null && value !== '',
  )
  const search = new URLSearchParams(
    pairs.map(([name, value]): [string, string] => [name, String(value)]),
  ).toString()
  return `/api${path}${search ? `?${search}` : ''}`
}
