/** `GET /api/w/{workshop}/{module}`: what anyone may know. */
export type ModulePublic = {
  module: { slug: string; name: string; oneLine: string; workshop: string; workshopName: string }
  offers: { offer: 'boards' | 'kit' | 'built'; priceMinor: number; depositMinor: number; currency: string }[]
  /** null while the owner hides it. */
  interest: { confirmed: number; units: number } | null
  run: {
    id: string
    state: 'taking_deposits' | 'locked'
    minimum: number
    maximum: number
    deposited: number
    held: number
    waiting: number
    decideBy: string
    opensToAllAt: string | null
    offers: {
      offer: 'boards' | 'kit' | 'built'
      priceMinor: number
      depositMinor: number
      postedBy: string
    }[]
  } | null
}
