import { isUtf8 } from 'node:buffer'
import express from 'express'

/** How the reader of bodies names one in another encoding. */
export const notInUtf8 = 'charset.unsupported'

/** Reads a body of JSON. Bytes that are not UTF-8 would be read as other letters, and kept as if somebody had written them. */
export const readJson = express.json({
  limit: '1mb',
  // null and 5 are JSON: a contract that asks for an object refuses them itself, and says so
  strict: false,
  verify: (_req, _res, bytes) => {
    if (!isUtf8(bytes)) throw Object.assign(new Error('a body that is not UTF-8'), { type: notInUtf8 })
  },
})
