import { compare, hash } from 'bcryptjs';

/** What the thread is asked for. bcrypt in plain JavaScript blocks for a quarter of a second, hence the thread. */
export type PasswordTask =
  | { readonly kind: 'hash'; readonly password: string; readonly cost: number }
  | { readonly kind: 'verify'; readonly password: string; readonly passwordHash: string };

export default function work(task: PasswordTask): Promise<string | boolean> {
  return task.kind === 'hash' ? hash(task.password, task.cost) : compare(task.password, task.passwordHash);
}
