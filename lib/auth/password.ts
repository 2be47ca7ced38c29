import { hash, verify, type Options } from "@node-rs/argon2";

// argon2id (the package's default). Source: OWASP password storage guidance, 19 MiB, two passes, one lane.
const cost: Options = { memoryCost: 19_456, timeCost: 2, parallelism: 1 };

/** The encoded argon2id hash of a password, salt and cost included. */
export function hashPassword(password: string): Promise<string> {
  return hash(password, cost);
}

let decoy: Promise<string> | undefined;

/**
 * Whether the password is the one hashed. Without a hash (nobody has that address) the same work is done for nothing, so
 * that the time taken does not tell whether an address is known.
 */
export async function isPassword(password: string, passwordHash: string | undefined): Promise<boolean> {
  if (passwordHash !== undefined) return verify(passwordHash, password);
  decoy ??= hashPassword("nobody has this password");
  await verify(await decoy, password);
  return false;
}
