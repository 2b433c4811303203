import argon2 from 'argon2';

/** argon2id with the parameters OWASP's password storage cheat sheet gives as a minimum: 19 MiB, two passes, one lane. */
const settings = { type: argon2.argon2id, memoryCost: 19_456, timeCost: 2, parallelism: 1 } as const;

export const hashPassword = (password: string): Promise<string> => argon2.hash(password, settings);

let decoy: Promise<string> | undefined;

/** False for a wrong password and for an unknown person, in the same time. */
export async function passwordFits(hash: string | null | undefined, password: string): Promise<boolean> {
  decoy ??= hashPassword('nobody has this password');
  const fits = await argon2.verify(hash ?? (await decoy), password);
  return fits && Boolean(hash);
}
