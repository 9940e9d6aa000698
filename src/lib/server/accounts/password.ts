import { hash, verify } from '@node-rs/argon2';

/** Source: OWASP Password Storage Cheat Sheet, argon2id with 19 MiB, 2 passes, 1 lane (from memory). */
const cost = { memoryCost: 19_456, timeCost: 2, parallelism: 1 };

export const shortestPassword = 12;

export function hashPassword(password: string): Promise<string> {
	return hash(password, cost);
}

/** A hash of nothing anybody can type, so that an unknown address takes as long as a known one. */
const decoy = hashPassword(`decoy ${Math.random()}`);

export async function isPassword(password: string, passwordHash: string | null): Promise<boolean> {
	const matches = await verify(passwordHash ?? (await decoy), password);
	return matches && passwordHash !== null;
}
