/** Refusals of the services under money. */
export const money: Record<string, string> = {}
