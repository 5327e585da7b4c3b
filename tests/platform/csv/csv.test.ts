import { createHash } from 'node:crypto'
import { buffer, text } from 'node:stream/consumers'
import { parse } from 'csv-parse/sync'
import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { csvStream, type CsvRow, type CsvTable } from '../../../server/platform/csv/csv-stream.ts'
import { guardCell } from '../../../server/platform/csv/guard-cell.ts'
import { withDigest } from '../../../server/platform/csv/with-digest.ts'

const written = (rows: CsvRow[], variant: CsvTable['variant'] = 'literal', header = ['accession', 'note']) =>
  text(csvStream({ header, rows, variant }))

describe('a literal CSV file', () => {
  // RFC 4180 §2: the rules and its own examples in 2.5 to 2.7.
  it('quotes comma, quote, CR and LF, doubles the inner quote, and ends every line with CRLF', async () => {
    expect(
      await written(
        [
          ['aaa', 'b\r\nbb', 'ccc'],
          ['zzz', 'yyy', 'xxx'],
          ['aaa', 'b"bb', 'ccc'],
          ['a,b', 'only\nLF', 'only\rCR'],
        ],
        'literal',
        ['one', 'two', 'three'],
      ),
    ).toBe(
      'one,two,three\r\n' +
        'aaa,"b\r\nbb",ccc\r\nzzz,yyy,xxx\r\naaa,"b""bb",ccc\r\n"a,b","only\nLF","only\rCR"\r\n',
    )
  })

  it('leaves every sign as it is, writes UTF-8 without a mark, and empty fields as nothing', async () => {
    const bytes = await bytesOf({
      header: ['accession', 'note'],
      rows: [
        ['HP-0412', '=2+3'],
        ['HP-0413', null],
        ['HP-0414', '5 µg/L, 23 °C'],
      ],
      variant: 'literal',
    })
    expect(bytes.subarray(0, 3).toString('latin1')).toBe('acc')
    expect(bytes.toString('utf8')).toBe(
      'accession,note\r\nHP-0412,=2+3\r\nHP-0413,\r\nHP-0414,"5 µg/L, 23 °C"\r\n',
    )
  })

  it('is its header alone when there are no rows', async () => {
    expect(await written([])).toBe('accession,note\r\n')
  })

  it('writes numbers with a point and without grouping, and refuses what is none', async () => {
    expect(await written([[1234.5, -0.25]])).toBe('accession,note\r\n1234.5,-0.25\r\n')
    await expect(written([[Number.NaN, 1]])).rejects.toThrow('NaN')
  })

  it('keeps an empty field of a one-column table readable', async () => {
    const file = await written([[null], ['b']], 'literal', ['only'])
    expect(parse(file)).toEqual([['only'], [''], ['b']])
  })

  it('gives back every text to an independent reader', async () => {
    const cell = fc.string({ unit: fc.constantFrom(...'ab,"\r\n;=+-@\t µé−\'') })
    await fc.assert(
      fc.asyncProperty(fc.array(fc.tuple(cell, cell), { maxLength: 20 }), async (rows) => {
        const file = await written(rows)
        expect(parse(file, { record_delimiter: '\r\n' })).toEqual([['accession', 'note'], ...rows])
      }),
      { numRuns: 200, seed: 20261201 },
    )
  })
})

describe('a guarded CSV file', () => {
  it.each([
    ['=1+1', "'=1+1"],
    ['+49 30', "'+49 30"],
    ['-1-1', "'-1-1"],
    ['- 2', "'- 2"],
    ['-', "'-"],
    ['@sum', "'@sum"],
    ['\tx', "'\tx"],
    ['\rx', "'\rx"],
    ['-12', '-12'],
    ['-0.5', '-0.5'],
    ['-.5', '-.5'],
    ['-1e-3', '-1e-3'],
    ['− 41.0 L', '− 41.0 L'],
    ['HP-0412', 'HP-0412'],
    ["'quoted", "'quoted"],
    ['', ''],
  ])('writes %j as %j', (cell, guarded) => {
    expect(guardCell(cell)).toBe(guarded)
  })

  it('guards cells and heads, marks UTF-8 for spreadsheets, and quotes after guarding', async () => {
    const bytes = await bytesOf({
      header: ['=a', 'b'],
      rows: [['=HYPERLINK("x","y")', -3]],
      variant: 'guarded',
    })
    expect(bytes.toString('utf8')).toBe('\ufeff\'=a,b\r\n"\'=HYPERLINK(""x"",""y"")",-3\r\n')
    expect(bytes.subarray(0, 3).toString('hex')).toBe('efbbbf')
  })
})

describe('streaming', () => {
  it('takes rows as they are read, and ends the source when the reader goes away', async () => {
    let taken = 0
    let ended = false
    async function* endless(): AsyncGenerator<CsvRow> {
      try {
        for (;;) yield [`HP-${taken++}`, 'x'.repeat(200)]
      } finally {
        ended = true
      }
    }
    const stream = csvStream({ header: ['accession', 'note'], rows: endless(), variant: 'literal' })
    for await (const chunk of stream) if (String(chunk).length > 0 && taken > 50) break
    await expect.poll(() => ended).toBe(true)
    expect(taken).toBeLessThan(5_000)
  })

  it('fails, rather than ends, when the source fails or a row is too short', async () => {
    async function* failing(): AsyncGenerator<CsvRow> {
      yield ['HP-1', 'a']
      throw new Error('the cursor was lost')
    }
    await expect(
      text(csvStream({ header: ['a', 'b'], rows: failing(), variant: 'literal' })),
    ).rejects.toThrow('cursor')
    await expect(written([['HP-1', 'a'], ['HP-2']])).rejects.toThrow('row 2 has 1 cells under a header of 2')
  })

  it('writes many rows whole', async () => {
    const rows = Array.from({ length: 30_000 }, (_, i): CsvRow => [`HP-${i}`, i])
    const lines = (await written(rows)).split('\r\n')
    expect(lines).toHaveLength(30_002)
    expect(lines[30_000]).toBe('HP-29999,29999')
  })
})

describe('the digest of an export', () => {
  const table: CsvTable = { header: ['a'], rows: [['µ']], variant: 'literal' }

  it('is that of the bytes sent, and known before the end is', async () => {
    let digest: { sha256: string; bytes: number } | undefined
    const file = await text(withDigest(csvStream(table), (found) => void (digest = found)))
    expect(digest).toEqual({
      sha256: createHash('sha256').update(file).digest('hex'),
      bytes: Buffer.byteLength(file),
    })
  })

  it('keeps the end back when it could not be recorded', async () => {
    const refused = withDigest(csvStream(table), () => Promise.reject(new Error('no audit row')))
    await expect(text(refused)).rejects.toThrow('no audit row')
  })

  it('is not recorded for an export that broke off', async () => {
    let recorded = false
    const broken = csvStream({ header: ['a'], rows: [['b', 'c']], variant: 'literal' })
    await expect(text(withDigest(broken, () => void (recorded = true)))).rejects.toThrow('row 1')
    expect(recorded).toBe(false)
  })
})

function bytesOf(table: CsvTable): Promise<Buffer> {
  return buffer(csvStream(table))
}
