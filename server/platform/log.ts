import { pino, stdSerializers } from 'pino'
import type { Logger, SerializedError } from 'pino'

export type Log = Logger

/** A lost connection brings its whole client with it, the statements it had prepared too. */
export function sayError(error: Error): Partial<SerializedError> {
  const { client: _client, ...said } = stdSerializers.err(error)
  return said
}

/** Structured log to standard output; secrets that may ride on a request are taken out. */
export function createLog(level: string): Log {
  return pino({
    level,
    serializers: { err: sayError },
    redact: [
      'req.headers.cookie',
      'req.headers.authorization',
      '*.password',
      '*.currentPassword',
      '*.newPassword',
    ],
  })
}
