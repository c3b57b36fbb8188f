export function portTrouble(port: number, host?: string): Promise<string | null>;
export function freePort(host?: string): Promise<number>;
export function freePorts(count: number, host?: string): Promise<number[]>;
export function checkPortsFree(wanted: { setting: string; port: number; host?: string }[]): Promise<void>;
