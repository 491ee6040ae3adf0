import { userInfo } from 'node:os';

/** Who is signed in to this machine, as far as it knows. */
export function accountName(): string {
  try {
    return userInfo().username;
  } catch {
    // An account that only a number stands for, as in many containers.
    return 'unnamed account';
  }
}
