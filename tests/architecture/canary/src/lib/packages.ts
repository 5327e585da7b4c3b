// breaks: not-in-the-browser
import 'node:fs'
// breaks: not-in-the-browser
import 'mathjs'
// breaks: not-in-the-browser
import 'express'
// breaks: not-in-the-browser
import 'typeorm'
// breaks: not-in-the-browser
import 'pg'
// breaks: not-in-the-browser
export * from 'mathjs/number'
// breaks: not-in-the-browser: not by import() either; mathjs only in src/lib/arithmetic.ts
export const later21 = () => import('node:fs')
// breaks: not-in-the-browser: not by import() either; mathjs only in src/lib/arithmetic.ts
export const later22 = () => import('mathjs')
// breaks: not-in-the-browser: not by import() either; mathjs only in src/lib/arithmetic.ts
export const later23 = () => import('express')
// breaks: not-in-the-browser: not by import() either; mathjs only in src/lib/arithmetic.ts
export const later24 = () => import('typeorm')
// breaks: not-in-the-browser: not by import() either; mathjs only in src/lib/arithmetic.ts
export const later25 = () => import('pg')
// breaks: consistent-type-imports
import { Thing } from './thing.ts'

export const used = (thing: Thing) => thing
