import { mkdtemp, readdir, readFile, rm, stat } from 'node:fs/promises'
import type { AddressInfo } from 'node:net'
import { createServer } from 'node:net'
import { tmpdir } from 'node:os'
import path from 'node:path'
import { text } from 'node:stream/consumers'
import { SMTPServer } from 'smtp-server'
import { afterEach, beforeEach, describe, expect, it } from 'vitest'
import { settableClock } from '../../../server/platform/clock.ts'
import { createMail, MailNotSetUp } from '../../../server/platform/mail/mail.ts'

const letter = {
  to: 'keeper@harrow-point.example',
  subject: 'Reset your password – Störe, 5 µg/L',
  text: 'Open this address within 30 min:\nhttps://pratique.example/reset?token=abc=def\n.\nZoé',
}

/** Reads a quoted-printable or base64 body back, as a mail reader does (RFC 2045 §6.7, §6.8). */
function bodyOf(message: string): string {
  const [head = '', ...rest] = message.split('\r\n\r\n')
  const body = rest.join('\r\n\r\n')
  const encoding = /^Content-Transfer-Encoding: (\S+)/im.exec(head)?.[1]?.toLowerCase()
  if (encoding === 'base64') return Buffer.from(body, 'base64').toString('utf8')
  if (encoding !== 'quoted-printable') return body
  const bytes = body
    .replace(/=\r\n/g, '')
    .replace(/=([0-9A-F]{2})/g, (_, hex: string) => String.fromCharCode(Number.parseInt(hex, 16)))
  return Buffer.from(bytes, 'latin1').toString('utf8')
}

describe('mail by SMTP', () => {
  let server: SMTPServer
  let port: number
  let received: { to: string[]; message: string }[]
  let refuse = false
  beforeEach(async () => {
    received = []
    refuse = false
    server = new SMTPServer({
      disabledCommands: ['AUTH', 'STARTTLS'],
      logger: false,
      onRcptTo: (_address, _session, done) => done(refuse ? new Error('no such mailbox') : undefined),
      onData: (stream, session, done) => {
        void text(stream).then((message) => {
          received.push({ to: session.envelope.rcptTo.map(({ address }) => address), message })
          done()
        }, done)
      },
    })
    await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve))
    port = (server.server.address() as AddressInfo).port
  })
  afterEach(() => new Promise<void>((resolve) => server.close(() => resolve())))

  it('delivers a letter whole to a real server on loopback', async () => {
    const mail = createMail({
      smtpUrl: `smtp://127.0.0.1:${port}`,
      folder: null,
      clock: settableClock(new Date('2026-12-01T09:30:00Z')),
    })
    expect(mail.kind).toBe('smtp')
    await mail.send(letter)
    mail.close()
    expect(received).toHaveLength(1)
    expect(received[0]?.to).toEqual([letter.to])
    const message = received[0]?.message ?? ''
    expect(message).toMatch(/^From: Pratique <pratique@localhost>$/m)
    expect(message).toMatch(/^Date: Tue, 01 Dec 2026 09:30:00 \+0000$/m)
    expect(message).toMatch(/^Content-Type: text\/plain; charset=utf-8$/m)
    expect(bodyOf(message).replaceAll('\r\n', '\n').trim()).toBe(letter.text)
  })

  it('cannot be made to write to others through a subject or an address', async () => {
    const mail = createMail({ smtpUrl: `smtp://127.0.0.1:${port}`, folder: null })
    await mail.send({ to: 'keeper@harrow-point.example', subject: 'a\r\nBcc: other@example.org', text: 'x' })
    mail.close()
    expect(received.flatMap(({ to }) => to)).toEqual(['keeper@harrow-point.example'])
    expect(received[0]?.message).not.toMatch(/^Bcc:/im)
  })

  it('says what the server answered when it refuses', async () => {
    refuse = true
    const mail = createMail({ smtpUrl: `smtp://127.0.0.1:${port}`, folder: null })
    await expect(mail.send(letter)).rejects.toThrow('no such mailbox')
    mail.close()
    expect(received).toEqual([])
  })

  it('fails when nobody answers at the address', async () => {
    const gone = createServer()
    await new Promise<void>((resolve) => gone.listen(0, '127.0.0.1', resolve))
    const { port: freed } = gone.address() as AddressInfo
    await new Promise((resolve) => gone.close(resolve))
    const mail = createMail({ smtpUrl: `smtp://127.0.0.1:${freed}`, folder: null })
    await expect(mail.send(letter)).rejects.toThrow('ECONNREFUSED')
    mail.close()
  })
})

describe('mail into the folder of the demo', () => {
  let folder: string
  beforeEach(async () => {
    folder = path.join(await mkdtemp(path.join(tmpdir(), 'pratique-mail-')), 'mailbox')
  })
  afterEach(() => rm(path.dirname(folder), { recursive: true, force: true }))

  it('lays down one .eml a letter, named so that they sort by time, for nobody else to read', async () => {
    const clock = settableClock(new Date('2026-12-01T09:30:00Z'))
    const mail = createMail({ smtpUrl: null, folder, clock })
    expect(mail.kind).toBe('folder')
    await mail.send(letter)
    clock.set(new Date('2026-12-01T09:31:00Z'))
    await mail.send({ ...letter, subject: 'second' })
    await mail.send({ ...letter, subject: 'third, same time' })
    const names = (await readdir(folder)).sort()
    expect(names).toHaveLength(3)
    expect(names[0]).toMatch(/^2026-12-01T09-30-00-000Z-[0-9a-f]{8}\.eml$/)
    const first = await readFile(path.join(folder, names[0] ?? ''), 'utf8')
    expect(first).toMatch(/^To: keeper@harrow-point\.example$/m)
    expect(bodyOf(first).replaceAll('\r\n', '\n').trim()).toBe(letter.text)
    expect((await stat(path.join(folder, names[0] ?? ''))).mode & 0o077).toBe(0)
  })
})

it('mail that can go nowhere says so', async () => {
  const mail = createMail({ smtpUrl: null, folder: null })
  expect(mail.kind).toBe('none')
  await expect(mail.send(letter)).rejects.toBeInstanceOf(MailNotSetUp)
})
