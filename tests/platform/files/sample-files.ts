import { spawnSync } from 'node:child_process'
import { deflateSync } from 'node:zlib'
import { drawDocument } from '../../../server/platform/pdf/draw-document.ts'
import { historyLike } from '../../pdf/examples/history-like.ts'

/** Real, small files of every kept type, made here so that no binary lies in the repository. */
export async function sampleFiles() {
  const pdf = Buffer.from(await drawDocument(historyLike(3)))
  return {
    pdf,
    png: png(2, 2),
    // Drawn by another program from our PDF.
    jpeg: jpegOf(pdf),
    // The smallest lossless WebP, 1 × 1.
    webp: Buffer.from('UklGRhoAAABXRUJQVlA4TA0AAAAvAAAAEAcQERGIiP4HAA==', 'base64'),
    csv: Buffer.from('\ufeffdate;value\r\n2026-05-14;7,0\r\n', 'utf8'),
    text: Buffer.from('Seen at 14:00: breathing normal, 23 °C, 5 µg/L.\n', 'utf8'),
  }
}

function jpegOf(pdf: Buffer): Buffer {
  const run = spawnSync('pdftoppm', ['-jpeg', '-r', '20', '-f', '1', '-l', '1', '-'], { input: pdf })
  if (run.status !== 0) throw run.error ?? new Error(run.stderr.toString())
  return run.stdout
}

/** A grey PNG with valid chunks and checksums (PNG 3rd edition §5). */
function png(width: number, height: number): Buffer {
  const chunk = (type: string, data: Buffer) => {
    const body = Buffer.concat([Buffer.from(type, 'latin1'), data])
    const length = Buffer.alloc(4)
    length.writeUInt32BE(data.length)
    const sum = Buffer.alloc(4)
    sum.writeUInt32BE(crc32(body))
    return Buffer.concat([length, body, sum])
  }
  const head = Buffer.alloc(13)
  head.writeUInt32BE(width, 0)
  head.writeUInt32BE(height, 4)
  head.set([8, 0, 0, 0, 0], 8)
  const rows = Buffer.alloc((width + 1) * height, 0x80)
  for (let row = 0; row < height; row++) rows[row * (width + 1)] = 0
  return Buffer.concat([
    Buffer.from('89504e470d0a1a0a', 'hex'),
    chunk('IHDR', head),
    chunk('IDAT', deflateSync(rows)),
    chunk('IEND', Buffer.alloc(0)),
  ])
}

function crc32(data: Buffer): number {
  let crc = 0xffffffff
  for (const byte of data) {
    crc ^= byte
    for (let bit = 0; bit < 8; bit++) crc = crc & 1 ? (crc >>> 1) ^ 0xedb88320 : crc >>> 1
  }
  return (crc ^ 0xffffffff) >>> 0
}
