/** The wanted port where it is free, else (or without one) any free port of the loopback address. */
export declare function freePort(wanted?: number): Promise<number>
