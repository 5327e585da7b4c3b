import { thing } from '../features/alpha/index.ts'
import { thing as ui } from '../ui/thing.ts'

export const used = [thing, ui]
