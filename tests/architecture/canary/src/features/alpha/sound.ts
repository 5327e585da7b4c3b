import { thing as domain } from '../../../shared/domain/thing.ts'
import { thing } from '../beta/index.ts'
import { inside } from './own.ts'

export const used = [domain, thing, inside]
