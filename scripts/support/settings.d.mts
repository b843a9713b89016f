type Given = Record<string, string | undefined>
export declare function readEnvFile(): void
export declare function wantsSandbox(given: Given): boolean
export declare function childSettings(
  given: Given,
  place: { dataFolder: string; databaseUrl: string; isDev?: boolean },
): Promise<Record<string, string>>
