import pg from 'pg'

/** What happens to a statement: `before` loses the connection unsent, `after` once it was carried out and unanswered. */
export type StatementBreak = 'before' | 'after'

/** Decides for the n-th statement of the application since the plan was made, from 1. */
export type StatementPlan = (statement: { n: number; text: string }) => StatementBreak | null

type Answer = (error: Error | null, result?: unknown) => void
type Connected = pg.Client & {
  connectionParameters: { application_name?: string }
  connection: { stream: { destroy: () => void } }
}

const LOST = 'Connection terminated unexpectedly'
const open = new Set<Connected>()
let plan: StatementPlan | null = null
let statements = 0
let isWatching = false

/**
 * Breaks the application's statements of this process by plan, as a connection that goes away; null ends it. The fake's
 * own books and the queue are other connections and stay whole.
 */
export function breakStatements(wanted: StatementPlan | null): void {
  watch()
  plan = wanted
  statements = 0
}

/** How many statements the application made since the last `breakStatements`. */
export const statementsSoFar = () => statements

/** Cuts every connection of the application: what was open is rolled back by the server, as when a process dies. */
export function cutConnections(): Promise<unknown> {
  const cut = [...open].map((client) => {
    const isOver = new Promise((done) => client.once('end', done))
    client.connection.stream.destroy()
    return isOver
  })
  open.clear()
  return Promise.all(cut)
}

function watch(): void {
  if (isWatching) return
  isWatching = true
  const query = pg.Client.prototype.query as (...given: unknown[]) => unknown
  pg.Client.prototype.query = function (this: Connected, ...given: unknown[]) {
    if (this.connectionParameters.application_name !== 'brimline') return query.apply(this, given)
    if (!open.has(this)) {
      open.add(this)
      this.once('end', () => open.delete(this))
    }
    statements += 1
    const broken = plan?.({ n: statements, text: String(given[0]) }) ?? null
    const answer = given.at(-1)
    if (broken === 'before') this.connection.stream.destroy()
    if (broken !== 'after' || typeof answer !== 'function') return query.apply(this, given)
    const lose: Answer = (error) => {
      this.connection.stream.destroy()
      ;(answer as Answer)(error ?? new Error(LOST))
    }
    return query.apply(this, [...given.slice(0, -1), lose])
  } as typeof pg.Client.prototype.query
}
