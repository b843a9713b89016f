/** Refusals of the services under post. */
export const post: Record<string, string> = {}
