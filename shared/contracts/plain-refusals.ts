import { z } from 'zod'
import { sayShape } from '../messages/refused-shapes.ts'

// The library's own sentences are for programmers; a schema that says something of its own is left to say it.
z.config({ customError: (issue) => sayShape(issue) })
