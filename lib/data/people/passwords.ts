import { hash, verify } from "@node-rs/argon2";

/** Argon2id with 19 MiB and two passes, the least that the OWASP password storage cheat sheet names. */
const SETTINGS = { memoryCost: 19_456, timeCost: 2, parallelism: 1 };
const AT_ONCE = 4;

let running = 0;
const waiting: (() => void)[] = [];

export async function hashPassword(password: string): Promise<string> {
  return oneOfFew(() => hash(password, SETTINGS));
}

/** False for a wrong password. A person without one costs the same time, so that names cannot be found out by the clock. */
export async function checkPassword(stored: string | null, password: string): Promise<boolean> {
  const against = stored ?? (await decoy());
  const right = await oneOfFew(() => verify(against, password));
  return right && stored !== null;
}

let decoyHash: Promise<string> | null = null;
function decoy(): Promise<string> {
  decoyHash ??= hash("nobody has this password", SETTINGS);
  return decoyHash;
}

/** Each check takes 19 MiB: only a few run at once, so that a flood of sign-ins cannot fill the memory. */
async function oneOfFew<T>(work: () => Promise<T>): Promise<T> {
  if (running >= AT_ONCE) await new Promise<void>((go) => waiting.push(go));
  else running += 1;
  try {
    return await work();
  } finally {
    const next = waiting.shift();
    if (next) next();
    else running -= 1;
  }
}
