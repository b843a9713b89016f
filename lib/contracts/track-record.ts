/** What a workshop's runs have shown so far. */
export type TrackRecord = {
  workshop: { name: string; currency: string; locale: string }
  classes: {
    name: 'certain' | 'likely' | 'curious' | 'oldSignUp' | 'depositHolder'
    converted: number
    asked: number
    /** 95 % interval of the share (Wilson). */
    low: number
    high: number
  }[]
  forecasts: {
    stated: number
    /** Ranges that held what came, of those stated. */
    held: number
    /** Null before anything was stated. */
    brier: number | null
    table: { from: number; to: number; stated: number; came: number; meanChance: number }[]
  }
  runs: {
    id: string
    number: number
    module: string
    state: string
    deposited: number | null
    minimum: number
    promisedBy: string | null
    postedOn: string | null
    daysLate: number | null
    started: number | null
    good: number | null
    receivedMinor: number
    refundedMinor: number
  }[]
}
