import { Worker } from 'node:worker_threads'
import type { PdfDocumentModel } from '../../../shared/domain/documents/pdf-document-model.ts'
import { messageLocale } from '../../../shared/messages/define-messages.ts'
import { PdfRenderError } from './pdf-render-error.ts'
import type { PdfAnswer, PdfJob } from './pdf-worker.ts'

export interface PdfPoolOptions {
  /** Threads at most; each holds some 60 MB. */
  threads?: number
  /** Documents that may wait; the next one is refused, so that a burst cannot fill the memory. */
  waiting?: number
  /** After this a document is given up and its thread replaced. */
  timeoutMs?: number
  /** Another worker's file, for tests of what happens when a thread dies. */
  workerFile?: URL
}

export interface PdfPool {
  /**
   * The document as the bytes of a PDF file.
   *
   * @throws PdfRenderError when the document must not be printed as it stands
   * @throws PdfPoolBusy when too many wait, or the pool is closed
   */
  renderPdf(model: PdfDocumentModel): Promise<Uint8Array>
  /** Lets what is running and waiting finish, takes nothing new, and ends the threads. */
  close(): Promise<void>
}

export class PdfPoolBusy extends Error {
  constructor(reason: 'full' | 'closed') {
    super(`PDF pool is ${reason}`)
    this.name = 'PdfPoolBusy'
  }
}

interface Waiting {
  job: PdfJob
  resolve(bytes: Uint8Array): void
  reject(error: Error): void
}

interface Thread {
  worker: Worker
  current?: Waiting
  timer?: NodeJS.Timeout
}

/** Threads that draw documents. None is started before the first document; idle ones do not hold the process. */
export function createPdfPool(options: PdfPoolOptions = {}): PdfPool {
  const { threads: most = 2, waiting: mostWaiting = 200, timeoutMs = 60_000 } = options
  const workerFile = options.workerFile ?? new URL('./pdf-worker.mjs', import.meta.url)
  const threads = new Set<Thread>()
  const queue: Waiting[] = []
  let closing: { promise: Promise<void>; done(): void } | undefined
  let nextId = 1

  // The server's own switches (a loader, a debugger) are not handed on: the worker loads what it needs itself.
  function start(): Thread {
    const thread: Thread = { worker: new Worker(workerFile, { execArgv: [] }) }
    thread.worker.on('message', (answer: PdfAnswer) => finish(thread, answer))
    thread.worker.on('error', (error) => lose(thread, error))
    thread.worker.on('exit', (code) => lose(thread, new Error(`PDF thread ended with code ${code}`)))
    threads.add(thread)
    return thread
  }

  function finish(thread: Thread, answer: PdfAnswer): void {
    const { current } = thread
    if (!current || current.job.id !== answer.id) return
    release(thread)
    if ('bytes' in answer) current.resolve(answer.bytes)
    else if ('refused' in answer)
      current.reject(new PdfRenderError(answer.refused.code, answer.refused.params))
    else current.reject(new Error(answer.failed))
    next()
  }

  /** A thread that died takes its document with it; the ones waiting go on in a fresh thread. */
  function lose(thread: Thread, error: Error): void {
    if (!threads.delete(thread)) return
    const { current } = thread
    release(thread)
    void thread.worker.terminate()
    current?.reject(error)
    next()
  }

  function release(thread: Thread): void {
    clearTimeout(thread.timer)
    delete thread.current
    thread.worker.unref()
  }

  function next(): void {
    const idle = [...threads].find((thread) => !thread.current)
    const waiting = queue[0]
    if (waiting && (idle || threads.size < most)) {
      queue.shift()
      const thread = idle ?? start()
      thread.current = waiting
      thread.worker.ref()
      thread.timer = setTimeout(
        () => lose(thread, new Error(`PDF not drawn within ${timeoutMs} ms`)),
        timeoutMs,
      )
      thread.worker.postMessage(waiting.job)
    }
    if (closing && queue.length === 0 && [...threads].every((thread) => !thread.current)) closing.done()
  }

  return {
    renderPdf: (model) =>
      new Promise((resolve, reject) => {
        if (closing) return reject(new PdfPoolBusy('closed'))
        if (queue.length >= mostWaiting) return reject(new PdfPoolBusy('full'))
        queue.push({ job: { id: nextId++, model, locale: messageLocale() }, resolve, reject })
        next()
      }),
    close: () => {
      if (!closing) {
        let done: () => void = () => undefined
        const drained = new Promise<void>((resolve) => (done = resolve))
        const promise = drained.then(async () => {
          const ending = [...threads]
          threads.clear()
          await Promise.all(ending.map((thread) => thread.worker.terminate()))
        })
        closing = { promise, done }
        next()
      }
      return closing.promise
    },
  }
}
