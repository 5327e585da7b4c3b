import { pino } from 'pino'
import type { Logger } from 'pino'

export type Log = Logger

/** Structured log to standard output; secrets that may ride on a request are taken out. */
export function createLog(level: string): Log {
  return pino({
    level,
    redact: [
      'req.headers.cookie',
      'req.headers.authorization',
      '*.password',
      '*.currentPassword',
      '*.newPassword',
    ],
  })
}
