import type { Request } from 'express';

const LOOPBACK = /^(::ffff:)?127[.]|^::1$/;
/** What proxies add: a request with one of these comes from elsewhere, whatever its last address. */
const HANDED_ON = ['forwarded', 'x-forwarded-for', 'x-real-ip', 'via'];

export const isLoopbackAddress = (address: string): boolean => LOOPBACK.test(address);

/** Whether a program on this machine asks for itself. */
export const isLoopback = (req: Request): boolean =>
  isLoopbackAddress(req.socket.remoteAddress ?? '') &&
  HANDED_ON.every((header) => req.get(header) === undefined);
