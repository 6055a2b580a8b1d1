import { createHash, createHmac, randomBytes, timingSafeEqual } from "node:crypto";

/** 256 random bits, for a cookie or a link. */
export function makeToken(): string {
  return randomBytes(32).toString("base64url");
}

/** What the table keeps of a token: its SHA-256, hex. Enough for 256 random bits. */
export function tokenHash(token: string): string {
  return createHash("sha256").update(token).digest("hex");
}

/** HMAC-SHA-256, hex, of something guessable, under the server's secret and for one purpose. */
export function keyedHash(secret: string, purpose: string, text: string): string {
  return createHmac("sha256", secret).update(`${purpose}\0${text}`).digest("hex");
}

/** Equal, in a time that does not tell how far. */
export function sameHash(a: string, b: string): boolean {
  const [left, right] = [Buffer.from(a, "hex"), Buffer.from(b, "hex")];
  return left.length === right.length && timingSafeEqual(left, right);
}
