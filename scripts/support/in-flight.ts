import type { IncomingMessage, ServerResponse } from 'node:http'

/** Answered without the database or from memory: never turned away. */
const CHEAP = /^\/(_next\/static\/|api\/health$|favicon\.ico$)/

/** Counts the requests being worked on and says when there is no room for another. */
export class InFlight {
  private readonly open = new Set<ServerResponse>()
  private isClosing = false

  constructor(private readonly most: number) {}

  /** Takes a place until the answer is done; false when none is free. */
  enter(request: IncomingMessage, response: ServerResponse): boolean {
    if (this.isClosing) response.setHeader('Connection', 'close')
    const path = request.url?.split('?', 1)[0] ?? ''
    if (!CHEAP.test(path) && this.open.size >= this.most) return false
    this.open.add(response)
    response.once('close', () => this.open.delete(response))
    return true
  }

  /** From now on every answer, also of those in hand, ends its connection. */
  closeWhenDone(): void {
    this.isClosing = true
    for (const response of this.open) if (!response.headersSent) response.setHeader('Connection', 'close')
  }
}
