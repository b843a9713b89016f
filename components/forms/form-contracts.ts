import type { z } from 'zod'

/** The schema behind each form, loaded when somebody begins to fill it in. The server reads the same one. */
export const FORM_CONTRACTS = {
  signIn: async () => (await import('@/lib/contracts/sign-in')).SignInInput,
  signInCode: async () => (await import('@/lib/contracts/sign-in')).SignInCodeInput,
  workshop: async () => (await import('@/lib/contracts/workshops')).WorkshopInput,
  secondFactor: async () => (await import('@/lib/contracts/sign-in')).SecondFactorInput,
  signUp: async () => (await import('@/lib/contracts/signups')).SignUpInput,
  run: async () => (await import('@/lib/contracts/runs')).RunInput,
  order: async () => (await import('@/lib/contracts/orders')).OrderInput,
  address: async () => (await import('@/lib/contracts/address')).AddressInput,
  pack: async () => (await import('@/lib/contracts/packing')).PackInput,
  handOver: async () => (await import('@/lib/contracts/packing')).HandOverInput,
  details: async () => (await import('@/lib/contracts/settings')).DetailsInput,
  postage: async () => (await import('@/lib/contracts/settings')).PostageInput,
  terms: async () => (await import('@/lib/contracts/settings')).TermsInput,
  moduleNew: async () => (await import('@/lib/contracts/module-forms')).ModuleNewInput,
  moduleFacts: async () => (await import('@/lib/contracts/module-forms')).ModuleFactsInput,
  offer: async () => (await import('@/lib/contracts/module-forms')).OfferInput,
  whatIf: async () => (await import('@/lib/contracts/what-ifs')).WhatIfInput,
  quote: async () => (await import('@/lib/contracts/part-forms')).QuoteInput,
  plan: async () => (await import('@/lib/contracts/plan-forms')).PlanInput,
} satisfies Record<string, () => Promise<z.ZodType>>

export type FormName = keyof typeof FORM_CONTRACTS
