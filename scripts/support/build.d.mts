export declare function ensureBuild(): Promise<void>
