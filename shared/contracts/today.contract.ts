import { z } from 'zod'
import { todayActs } from '../domain/today/today-acts.ts'
import { todayStates } from '../domain/today/today-item.ts'
import { todayKindNames } from '../domain/today/today-kinds.ts'
import { contract } from './contract.ts'
import { HandoverNote } from './handover.contract.ts'
import { Instant, LocalDate } from './primitives.ts'
import { todayAddresses } from './today.addresses.ts'

const Params = z
  .record(z.string(), z.union([z.string(), z.number()]))
  .describe('Numbers, names and figures for the words and for the address')

/** One piece of work; shared/domain/today says what its state and times mean. */
export const TodayWork = z.object({
  id: z.string().describe('Names the work for as long as it stands'),
  kind: z.enum(todayKindNames).describe('Kind of work; its lane and who may do it follow from it'),
  state: z.enum(todayStates).describe('Where it stands'),
  dueAt: Instant.nullable().describe('When it is due, where it has an hour'),
  latestAt: Instant.nullable().describe('Last instant at which it is on time'),
  dueOn: LocalDate.nullable().describe('First day on which it is on time, where it has days'),
  latestOn: LocalDate.nullable().describe('Last day on which it is on time'),
  at: Instant.nullable().describe('When it was done; since when it waits or runs'),
  params: Params,
  acts: z.array(z.enum(todayActs)).describe('What the reader may do with it without going anywhere'),
})
export type TodayWork = z.infer<typeof TodayWork>

export const TodayLogLine = z.object({
  id: z.string().describe('Record'),
  kind: z.enum(['observation', 'dose', 'bath-ended']).describe('What happened'),
  at: Instant.describe('When it happened'),
  by: z.string().describe('Who recorded it'),
  params: Params,
})
export type TodayLogLine = z.infer<typeof TodayLogLine>

export const getToday = contract({
  ...todayAddresses.getToday,
  action: 'collection.read',
  summary:
    'What is late, due, waiting and coming for the roles of the reader, in order, and what was done today',
  reply: {
    200: z.object({
      at: Instant.describe('The instant that all of this holds for'),
      on: LocalDate.describe('Its day at the facility'),
      items: z.array(TodayWork).describe('Work in the order in which it is seen to; done last'),
      handover: z
        .array(HandoverNote)
        .describe('Notes of the last two days for the next watch, the newest first'),
      log: z.array(TodayLogLine).describe('What happened in the last 24 hours, the newest first'),
    }),
  },
  problems: [],
})
