import { expect } from 'vitest'
import type { Test } from 'supertest'
import type { TestPerson } from './api.ts'

/** A document of the server as its bytes: supertest reads a body as text unless it is told otherwise. */
export async function readPdf(request: Test): Promise<Uint8Array> {
  const reply = await request
    .buffer(true)
    .parse((res, done) => {
      const chunks: Buffer[] = []
      res.on('data', (chunk: Buffer) => chunks.push(chunk))
      res.on('end', () => done(null, Buffer.concat(chunks)))
    })
    .expect(200)
  expect(reply.headers['content-type']).toContain('application/pdf')
  return reply.body as Uint8Array
}

/** The document at an address. */
export const fetchPdf = ({ agent }: TestPerson, path: string): Promise<Uint8Array> => readPdf(agent.get(path))
