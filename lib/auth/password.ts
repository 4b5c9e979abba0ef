import { hash, verify } from "@node-rs/argon2";

/** argon2id with OWASP's first recommended setting (19 MiB, two passes; from memory). */
const OPTIONS = { memoryCost: 19_456, timeCost: 2, parallelism: 1 };

export function hashPassword(password: string): Promise<string> {
  return hash(password, OPTIONS);
}

export async function verifyPassword(passwordHash: string, password: string): Promise<boolean> {
  try {
    return await verify(passwordHash, password);
  } catch {
    return false;
  }
}

let decoy: Promise<string> | undefined;

/** Costs the same as a real check, so that timing does not tell which addresses exist. */
export async function verifyAgainstNobody(password: string): Promise<false> {
  decoy ??= hashPassword("nobody has this password");
  await verifyPassword(await decoy, password);
  return false;
}
