/** What stands on the provider's card page and on the buyer's bank statement's details. */
export const paymentDescription = {
  deposit: (module: string, number: number) => `Deposit for ${module}, order ${number}`,
  balance: (module: string, number: number) => `Balance for ${module}, order ${number}`,
  change: (module: string, number: number) => `Change of order ${number}, ${module}`,
} as const
