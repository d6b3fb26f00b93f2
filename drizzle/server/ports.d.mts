/** Whether a port of loopback can be listened on. */
export function isFree(port: number): Promise<boolean>;
/** A port of loopback that nobody listens on now. */
export function freePort(): Promise<number>;
