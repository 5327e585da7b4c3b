import { describe, expect, it } from 'vitest'
import { originalName } from '../../../server/platform/files/original-name.ts'
import { sniffType } from '../../../server/platform/files/sniff-type.ts'
import { sampleFiles } from './sample-files.ts'

describe('the type of a file', () => {
  it('is that of its content, whatever its name says', async () => {
    const files = await sampleFiles()
    for (const name of ['permit', 'permit.exe', 'permit.csv', 'permit.png']) {
      expect(sniffType(files.pdf, name)).toBe('application/pdf')
      expect(sniffType(files.png, name)).toBe('image/png')
      expect(sniffType(files.jpeg, name)).toBe('image/jpeg')
      expect(sniffType(files.webp, name)).toBe('image/webp')
    }
  })

  it('is a table for a text named so, else a plain text', async () => {
    const { csv, text } = await sampleFiles()
    expect(sniffType(csv, 'READINGS.CSV')).toBe('text/csv')
    expect(sniffType(csv, 'readings.txt')).toBe('text/plain')
    expect(sniffType(text, 'note')).toBe('text/plain')
  })

  it.each<[string, Buffer | string]>([
    ['nothing', ''],
    ['a program for Linux', Buffer.from('7f454c460201010000', 'hex')],
    ['a program for Windows', Buffer.from('4d5a900003000000', 'hex')],
    ['an archive or an office file', Buffer.from('504b030414000600', 'hex')],
    ['a GIF', 'GIF89a\u0001\u0000'],
    ['a page', '\n <!DOCTYPE html><script>alert(1)</script>'],
    ['a page without a head', '<script>alert(1)</script>'],
    ['a drawing that can run', '<?xml version="1.0"?><svg onload="x()"/>'],
    ['a text with a null', 'abc\u0000def'],
    ['a text with an escape', 'abc\u001b[31m'],
    ['bytes that are no UTF-8', Buffer.from('c328a0a1', 'hex')],
    ['sound that begins as WebP does', Buffer.from('52494646240000005741564566', 'hex')],
    ['a PNG signature alone', Buffer.from('89504e470d0a1a0a', 'hex')],
    ['a PDF behind other bytes', Buffer.from(`MZ\u0000%PDF-1.7`)],
  ])('is not accepted for %s, even when named permit.pdf', (_what, content) => {
    expect(sniffType(Buffer.from(content as string), 'permit.pdf')).toBeUndefined()
  })

  it('accepts a text that only mentions a tag or compares numbers', () => {
    expect(sniffType(Buffer.from('oxygen < 5 mg/L, see <b>'), 'a.txt')).toBe('text/plain')
    expect(sniffType(Buffer.from('< 5 mg/L'), 'a.txt')).toBe('text/plain')
  })
})

describe('the name of a file', () => {
  const asForm = (name: string) => Buffer.from(name, 'utf8').toString('latin1')

  it.each([
    'Haltungsgenehmigung für Störe.pdf',
    'permit — 5 µg.pdf',
    '許可証.pdf',
    'Zoë’s note.txt',
    'plain.pdf',
  ])('%j comes back as it was given', (name) => {
    expect(originalName(asForm(name))).toBe(name)
  })

  it('stays when it was Latin-1 after all, or already read rightly', () => {
    expect(originalName('Stör.pdf')).toBe('Stör.pdf')
    expect(originalName('許可証.pdf')).toBe('許可証.pdf')
  })

  it('is composed, however it was typed', () => {
    expect(originalName(asForm('Sto\u0308r.pdf'))).toBe('Stör.pdf')
  })

  it.each([
    ['../../etc/passwd', 'passwd'],
    ['C:\\papers\\permit.pdf', 'permit.pdf'],
    ['a\u0000b\r\n.pdf', 'a b .pdf'],
    ['', 'file'],
    ['..', 'file'],
    ['dir/', 'file'],
    ['invoice\u202efdp.exe', 'invoicefdp.exe'],
  ])('%j becomes %j', (sent, kept) => {
    expect(originalName(asForm(sent))).toBe(kept)
  })

  it('keeps its extension when it is too long', () => {
    const name = originalName(asForm(`${'ü'.repeat(400)}.pdf`))
    expect([...name]).toHaveLength(180)
    expect(name.endsWith('ü.pdf')).toBe(true)
  })
})
