import { request as httpRequest } from 'node:http'
import type { AddressInfo } from 'node:net'
import express from 'express'
import request from 'supertest'
import { beforeAll, describe, expect, it } from 'vitest'
import { createFileReceiver, type ReceiveOptions } from '../../../server/platform/files/receive-file.ts'
import { Problem } from '../../../server/platform/http/problem.ts'
import { sampleFiles } from './sample-files.ts'

type Samples = Awaited<ReturnType<typeof sampleFiles>>
let files: Samples
beforeAll(async () => {
  files = await sampleFiles()
})

/** An application with nothing but the receiver; refusals are shown as the edge would. */
function application(options?: ReceiveOptions) {
  const receive = createFileReceiver(options)
  const app = express()
  app.post('/papers', async (req, res) => {
    const { file, fields } = await receive(req, res)
    res.json({ name: file.name, type: file.type, bytes: file.bytes, same: file.content.length, fields })
  })
  app.use(((error, _req, res, next) => {
    if (!(error instanceof Problem)) return next(error)
    res.status(error.status).json({ code: error.code, ...error.details })
  }) satisfies express.ErrorRequestHandler)
  return app
}

describe('receiving a file', () => {
  it('gives content, name, sniffed type and the form’s other fields', async () => {
    const reply = await request(application())
      .post('/papers')
      .field('title', 'Genehmigung für Störe')
      .attach('file', files.pdf, { filename: 'Genehmigung für Störe.pdf', contentType: 'image/gif' })
    expect(reply.body).toEqual({
      name: 'Genehmigung für Störe.pdf',
      type: 'application/pdf',
      bytes: files.pdf.length,
      same: files.pdf.length,
      fields: { title: 'Genehmigung für Störe' },
    })
  })

  it('takes every kept type', async () => {
    for (const [name, content] of Object.entries(files)) {
      const reply = await request(application()).post('/papers').attach('file', content, `sample.${name}`)
      expect(reply.status, name).toBe(200)
    }
  })

  it('takes a file of exactly the limit and refuses one byte more, naming the limit', async () => {
    const app = application({ limitMB: 1 })
    const full = Buffer.alloc(1024 * 1024, 'a')
    expect((await request(app).post('/papers').attach('file', full, 'a.txt')).body.bytes).toBe(full.length)
    const reply = await request(app)
      .post('/papers')
      .attach('file', Buffer.concat([full, Buffer.from('a')]), 'a.txt')
    expect(reply.status).toBe(422)
    expect(reply.body).toEqual({
      code: 'file-too-large',
      detail: 'A file may have at most 1\u00a0MB.',
      errors: [{ pointer: '/file', detail: 'A file may have at most 1\u00a0MB.' }],
    })
  })

  it('has a limit of 15 MB when none is said', async () => {
    const reply = await request(application())
      .post('/papers')
      .attach('file', Buffer.alloc(15 * 1024 * 1024 + 1, 'a'), 'a.txt')
    expect(reply.body.detail).toBe('A file may have at most 15\u00a0MB.')
  })

  it('refuses by content, not by name or claim', async () => {
    const reply = await request(application())
      .post('/papers')
      .attach('file', Buffer.from('<html><script>x()</script>'), {
        filename: 'permit.pdf',
        contentType: 'application/pdf',
      })
    expect(reply.body).toMatchObject({ code: 'file-type-not-allowed', errors: [{ pointer: '/file' }] })
    expect(reply.body.detail).toContain('permit.pdf is not a PDF')
  })

  it('refuses a kept type that this form does not want', async () => {
    const app = application({ allowed: ['text/csv'], field: 'table' })
    expect((await request(app).post('/papers').attach('table', files.pdf, 'a.csv')).body.code).toBe(
      'file-type-not-allowed',
    )
    expect((await request(app).post('/papers').attach('table', files.csv, 'a.csv')).body.type).toBe(
      'text/csv',
    )
  })

  it.each<[string, (test: request.Test) => request.Test, string]>([
    ['no file', (test) => test.field('title', 'x'), 'Choose a file and send the form again.'],
    [
      'an empty file',
      (test) => test.attach('file', Buffer.alloc(0), 'a.pdf'),
      'The file is empty. Choose the file with its content.',
    ],
    [
      'JSON instead of a form',
      (test) => test.send({ file: 'a.pdf' }),
      'Choose a file and send the form again.',
    ],
    ['no body', (test) => test, 'Choose a file and send the form again.'],
  ])('says that the file is missing for %s', async (_what, fill, detail) => {
    const reply = await fill(request(application()).post('/papers'))
    expect(reply.status).toBe(422)
    expect(reply.body).toMatchObject({ code: 'file-missing', detail })
  })

  it.each<[string, (test: request.Test) => request.Test]>([
    ['two files', (test) => test.attach('file', files.png, 'a.png').attach('file', files.png, 'b.png')],
    ['a file in another field', (test) => test.attach('other', files.png, 'a.png')],
  ])('says what to do about %s', async (_what, fill) => {
    const reply = await fill(request(application()).post('/papers'))
    expect(reply.status).toBe(422)
    expect(reply.body).toMatchObject({
      code: 'bad-input',
      detail: 'Send one file at a time, in the field named for it.',
    })
  })

  it.each([
    ['multipart/form-data', 'x'],
    [
      'multipart/form-data; boundary=b',
      '--b\r\nContent-Disposition: form-data; name="file"; filename="a.txt"\r\n\r\nhalf',
    ],
  ])('answers a broken form (%s) as bad input, not as a fault of its own', async (type, body) => {
    const server = application().listen(0, '127.0.0.1')
    try {
      await new Promise((resolve) => server.once('listening', resolve))
      const { port } = server.address() as AddressInfo
      const answer = await new Promise<{ status?: number; text: string }>((resolve, reject) => {
        const sent = httpRequest(
          { port, host: '127.0.0.1', method: 'POST', path: '/papers', headers: { 'content-type': type } },
          (res) => {
            let text = ''
            res.on('data', (chunk: Buffer) => (text += chunk.toString()))
            res.on('end', () => resolve({ ...(res.statusCode ? { status: res.statusCode } : {}), text }))
          },
        )
        sent.on('error', reject)
        sent.end(body)
      })
      expect(answer.status).toBe(422)
      expect(JSON.parse(answer.text)).toMatchObject({
        code: 'bad-input',
        detail: 'The form arrived incomplete. Send it again.',
      })
    } finally {
      await new Promise((resolve) => server.close(resolve))
    }
  })
})
