import { createHash } from 'node:crypto'
import { pipeline, Transform, type Readable } from 'node:stream'

export interface StreamDigest {
  /** 64 lower-case hexadecimal digits over the bytes as sent. */
  sha256: string
  bytes: number
}

/**
 * Passes a file through and gives its digest to `record` when all of it has gone by, before the end is sent on: a
 * reader has the whole file only if the export was recorded. An export that breaks off is not recorded.
 */
export function withDigest(
  source: Readable,
  record: (digest: StreamDigest) => Promise<void> | void,
): Readable {
  const hash = createHash('sha256')
  let bytes = 0
  const passing = new Transform({
    transform(chunk: Buffer | string, encoding, done) {
      const data = typeof chunk === 'string' ? Buffer.from(chunk, encoding) : chunk
      hash.update(data)
      bytes += data.length
      done(null, data)
    },
    flush(done) {
      Promise.resolve(record({ sha256: hash.digest('hex'), bytes })).then(
        () => done(),
        (error: unknown) => done(error instanceof Error ? error : new Error(String(error))),
      )
    },
  })
  pipeline(source, passing, () => undefined)
  return passing
}
