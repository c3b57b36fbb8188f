import { createHash, randomBytes } from 'node:crypto';

/** 256 random bits, fit for an address or a cookie. */
export const newSecret = (): string => randomBytes(32).toString('base64url');

/** What is kept of a secret: enough to know it again, of no use to whoever reads the table. */
export const fingerprint = (secret: string): string => createHash('sha256').update(secret).digest('hex');

/** An e-mail address as it is kept and compared. */
export const normaliseEmail = (email: string): string => email.trim().toLowerCase();
