export class PortTaken extends Error {}
export function demandFreePort(port: number, what: string, variable: string): Promise<void>;
export function freePort(): Promise<number>;
