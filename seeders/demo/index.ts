/** Who can sign in to the demo, in the order a visitor would try them. */
export const DEMO_SIGN_INS: readonly { email: string; what: string }[] = [
  { email: 'host@brimline.example', what: 'host: opens and suspends workshops' },
]

/** Makes the demo by the services, as people act. No workshop is invented yet: only the host can sign in. */
export async function seedDemo(_say: (sentence: string) => void): Promise<void> {}
