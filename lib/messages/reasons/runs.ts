/** Refusals of the services under runs. */
export const runs: Record<string, string> = {}
