/** Refusals of the services under workshops. */
export const workshops: Record<string, string> = {}
