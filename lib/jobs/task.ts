import type { JobName, JobPayload } from './names'

/** What a handler hears about its own run: `attempt` counts from 1. */
export type TaskContext = { jobId: string; attempt: number; maxAttempts: number }

/** A handler. Run at least once: a second run of the same job must change nothing more. */
export type Task<N extends JobName> = (payload: JobPayload<N>, context: TaskContext) => Promise<void>

export type Tasks = { readonly [N in JobName]: Task<N> }
