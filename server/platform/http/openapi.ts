import { z } from 'zod'
import { successStatus } from '../../../shared/contracts/contract.ts'
import type { Contract } from '../../../shared/contracts/contract.ts'
import { allContracts } from '../../../shared/contracts/index.ts'
import { personHeader } from '../../../shared/contracts/person-header.ts'
import { ProblemBody, problemStatus } from '../../../shared/contracts/problems.ts'
import { mediaTypes, refusalsOf } from './replies-of.ts'

type Schema = Record<string, unknown>

const schemaOf = (schema: z.ZodType, io: 'input' | 'output'): Schema => {
  const { $schema: _dialect, ...rest } = z.toJSONSchema(schema, { io, unrepresentable: 'any' }) as Schema
  return rest
}

function parametersOf(schema: z.ZodType | undefined, place: 'path' | 'query'): Schema[] {
  if (!schema) return []
  const object = schemaOf(schema, 'input')
  const required = (object['required'] as string[] | undefined) ?? []
  return Object.entries((object['properties'] as Record<string, Schema> | undefined) ?? {}).map(
    ([name, property]) => ({
      name,
      in: place,
      required: place === 'path' || required.includes(name),
      description: property['description'],
      schema: property,
    }),
  )
}

function problemsOf(of: Contract): Schema {
  const byStatus = new Map<number, string[]>()
  for (const code of refusalsOf(of)) {
    const status = problemStatus[code]
    byStatus.set(status, [...(byStatus.get(status) ?? []), code])
  }
  return Object.fromEntries(
    [...byStatus].map(([status, codes]) => [
      String(status),
      {
        description: codes.join(', '),
        content: { 'application/problem+json': { schema: { $ref: '#/components/schemas/Problem' } } },
      },
    ]),
  )
}

function operationOf(of: Contract): Schema {
  const reply = Object.values(of.reply)[0]
  const status = String(successStatus(of))
  const media = mediaTypes[of.produces ?? 'json']
  const content = reply && of.produces === undefined ? schemaOf(reply, 'output') : { type: 'string' }
  const key = {
    name: 'Idempotency-Key',
    in: 'header',
    required: true,
    description: 'A new UUID for each command, the same one on a retry',
    schema: { type: 'string' },
  }
  const writer = {
    name: personHeader,
    in: 'header',
    required: false,
    description:
      'Id of whoever wrote it; refused as different-person when somebody else is signed in by then',
    schema: { type: 'string' },
  }
  return {
    operationId: of.id,
    summary: of.summary,
    'x-action': of.action,
    parameters: [
      ...parametersOf(of.params, 'path'),
      ...parametersOf(of.query, 'query'),
      ...(of.idempotent === 'by-key' ? [key] : []),
      ...(of.method === 'get' || of.action === 'public' ? [] : [writer]),
    ],
    ...(of.body
      ? {
          requestBody: {
            required: true,
            content: {
              [of.consumes === 'multipart' ? 'multipart/form-data' : 'application/json']: {
                schema: schemaOf(of.body, 'input'),
              },
            },
          },
        }
      : {}),
    responses: {
      [status]: {
        description: 'Done',
        ...(status === '204' ? {} : { content: { [media]: { schema: content } } }),
      },
      ...problemsOf(of),
    },
  }
}

/** OpenAPI 3.1 of every contract; made from them, so it cannot say anything else than the server does. */
export function openApiDocument(): Schema {
  const paths: Record<string, Schema> = {}
  for (const of of allContracts) {
    const path = `/api${of.path.replace(/:(\w+)/g, '{$1}')}`
    paths[path] = { ...paths[path], [of.method]: operationOf(of) }
  }
  return {
    openapi: '3.1.0',
    info: {
      title: 'Pratique',
      version: '1',
      description:
        'Decision support for licensed professionals. Check every figure against local law, the label and the safety data sheet.',
    },
    paths,
    components: { schemas: { Problem: schemaOf(ProblemBody, 'output') } },
  }
}
