import { z } from 'zod'
import { contract } from './contract.ts'

/* By itself, since a sheet that prints needs no description of every calculator. */
export const printBenchSheet = contract({
  id: 'printBenchSheet',
  method: 'post',
  path: '/bench/:calculator/sheet',
  action: 'collection.read',
  summary:
    'Ask a calculator and print the answer as PDF: inputs, working, sources and cautions; nothing is kept',
  params: z.strictObject({ calculator: z.string().describe('Name of a calculator') }),
  // as the calculator itself takes it
  body: z.record(z.string(), z.unknown()).describe('What the calculator is asked; see its own address'),
  reply: { 200: z.string().describe('PDF') },
  problems: ['not-found', 'not-computable', 'working-disagrees', 'print-busy', 'print-failed'],
  idempotent: 'nothing-kept',
  produces: 'pdf',
})
