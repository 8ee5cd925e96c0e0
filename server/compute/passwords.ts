import { randomBytes } from 'node:crypto';
import { Piscina } from 'piscina';
import type { PasswordTask } from './password-worker.ts';
import { resolveWorkerFile } from './worker-file.ts';

/** bcrypt looks at no more than this many bytes: what is longer cannot be set, and matches nobody's. */
const MAX_PASSWORD_BYTES = 72;

const isTooLong = (password: string) => Buffer.byteLength(password) > MAX_PASSWORD_BYTES;

export interface Passwords {
  hash(password: string): Promise<string>;
  /** Takes as long for somebody unknown (no hash) as for a wrong password, so that the answer's time tells nothing. */
  verify(password: string, passwordHash: string | undefined): Promise<boolean>;
  close(): Promise<void>;
}

export async function startPasswords(cost: number): Promise<Passwords> {
  const piscina = new Piscina<PasswordTask, string | boolean>({
    filename: await resolveWorkerFile('password-worker'),
    minThreads: 1,
    maxThreads: 1,
  });
  const hash = async (password: string) => {
    if (isTooLong(password)) throw new RangeError(`A password is at most ${MAX_PASSWORD_BYTES} bytes long`);
    return String(await piscina.run({ kind: 'hash', password, cost }));
  };
  const nobodysHash = await hash(randomBytes(18).toString('base64'));
  return {
    hash,
    verify: async (password, passwordHash) => {
      const matches = await piscina.run({
        kind: 'verify',
        password,
        passwordHash: passwordHash ?? nobodysHash,
      });
      return matches === true && passwordHash !== undefined && !isTooLong(password);
    },
    close: () => piscina.destroy(),
  };
}
