import { z } from 'zod'
import { thing } from '../domain/thing.ts'

export const used = z.literal(thing.name)
