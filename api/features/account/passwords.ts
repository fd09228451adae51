import { hash, verify, type Options } from '@node-rs/argon2';
import { AppError } from '../../http/problem.ts';
import { isCommonPassword } from './common-passwords.ts';

/** argon2id, the library's default kind, with 19 MiB, two passes and one lane. */
const COST: Options = { memoryCost: 19_456, timeCost: 2, parallelism: 1 };

/** The same letters may be typed as different code points on two keyboards; nothing else is changed or cut off. */
const typed = (password: string) => password.normalize('NFC');

/** @returns the argon2id hash with its salt and cost, to be stored */
export function hashPassword(password: string): Promise<string> {
  return hash(typed(password), COST);
}

let nobody: Promise<string> | undefined;

/**
 * Compares a password with a stored hash. Without one it works just as long and says no, so that an unknown address
 * cannot be told from a wrong password by the clock.
 */
export async function isPassword(password: string, stored: string | undefined): Promise<boolean> {
  nobody ??= hashPassword('nobody has this password');
  const fits = await verify(stored ?? (await nobody), typed(password));
  return fits && stored !== undefined;
}

/**
 * Refuses what is tried first by those who guess.
 * @param field the body's field the answer points to
 * @throws AppError invalid
 */
export function refuseCommon(password: string, field = 'password'): void {
  if (!isCommonPassword(password)) return;
  const detail = 'This is one of the 3,000 passwords that are tried first. Three or four words in a row do well.';
  throw new AppError('invalid', '', { errors: [{ pointer: `#/${field}`, detail }] });
}
