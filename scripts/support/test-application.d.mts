export type TestApplication = {
  baseUrl: string
  databaseUrl: string
  /** One file per part: web.log, worker.log, provider.log, mail-server.log. */
  logFolder: string
  env: Record<string, string>
  /** Runs a TypeScript script in the application's environment; gives back what it printed. */
  run: (script: string, args?: string[]) => Promise<{ code: number; output: string }>
  pidOf: (part: 'web' | 'worker' | 'provider' | 'mail-server') => number | undefined
  stop: () => Promise<void>
}
export declare function startTestApplication(options: {
  serverUrl: string
  template: string
  name: string
  folder: string
  settings?: Record<string, string>
}): Promise<TestApplication>
