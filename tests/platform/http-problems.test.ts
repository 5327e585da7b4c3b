import express from 'express'
import request from 'supertest'
import { describe, expect, it } from 'vitest'
import { createLog } from '../../server/platform/log.ts'
import { problemEdge } from '../../server/platform/http/to-problem.ts'
import { createPdfPool } from '../../server/platform/pdf/pdf-pool.ts'
import { drawDocument } from '../../server/platform/pdf/draw-document.ts'
import { orderLike } from '../pdf/examples/order-like.ts'

function serve(handler: () => Promise<unknown>) {
  const app = express()
  app.get('/print', async () => {
    await handler()
  })
  app.use(problemEdge(createLog('silent')))
  return request(app).get('/print')
}

describe('a print that does not come about', () => {
  it('for want of a free thread is told to come again: 503, with a time to wait', async () => {
    const pool = createPdfPool()
    await pool.close()
    const reply = await serve(() => pool.renderPdf(orderLike()))
    expect(reply.status).toBe(503)
    expect(reply.headers['retry-after']).toBe('5')
    expect(reply.body).toMatchObject({ code: 'print-busy', title: 'Too much is being printed at once' })
    expect(reply.body.detail).toContain('Try again in a moment')
  })

  it('because a character cannot be drawn is a fault of ours: 500, and says to work from the screen', async () => {
    const reply = await serve(() =>
      drawDocument(orderLike({ blocks: [{ kind: 'paragraph', text: 'all well 🐟' }] })),
    )
    expect(reply.status).toBe(500)
    expect(reply.body.code).toBe('print-failed')
    expect(reply.body.detail).toContain('a character that cannot be drawn on paper')
  })
})
