export declare function startDatabase(
  dataFolder: string,
  options?: { port?: number; throwAway?: boolean },
): Promise<{ url: string; port: number; isStartedHere: boolean }>
export declare function stopDatabase(dataFolder: string): Promise<void>
export declare function databaseUrl(dataFolder: string, database?: string): string | null
export declare function ensureDatabase(serverUrl: string, name?: string): Promise<string>
export declare function removeDatabase(dataFolder: string): Promise<void>
export declare function psql(url: string, statement: string): Promise<string>
