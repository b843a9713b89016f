export declare function contentPolicy(page: {
  scripts: readonly string[]
  cardPageUrl?: string
  isDev?: boolean
  isHttps?: boolean
}): string
export declare const BARE_POLICY: string
