import type { SpawnOptions } from 'node:child_process'

/** One plain progress line. */
export declare function say(sentence: string): void
export declare class Stop extends Error {}
export declare function main(body: () => Promise<void>): void
/** Runs a program to its end and gives back what it printed; a failing one throws with its last lines. */
export declare function run(
  command: string,
  args: string[],
  options?: Omit<SpawnOptions, 'env'> & {
    env?: Record<string, string | undefined>
    show?: boolean
    allowFailure?: boolean
    input?: string
  },
): Promise<{ code: number; output: string }>
