import { customType, datetime } from "drizzle-orm/mysql-core";

function hyphenate(hex: string): string {
  return `${hex.slice(0, 8)}-${hex.slice(8, 12)}-${hex.slice(12, 16)}-${hex.slice(16, 20)}-${hex.slice(20)}`;
}

/** An id: a UUID as lower-case text here, BINARY(16) in the table. */
export const uuid = customType<{ data: string; driverData: Buffer }>({
  dataType: () => "binary(16)",
  toDriver: uuidBytes,
  fromDriver: (bytes) => hyphenate(bytes.toString("hex")),
});

/** A SHA-256: 64 hex digits here, BINARY(32) in the table. */
export const sha256 = customType<{ data: string; driverData: Buffer }>({
  dataType: () => "binary(32)",
  toDriver: (hex) => Buffer.from(hex, "hex"),
  fromDriver: (bytes) => bytes.toString("hex"),
});

/** An instant, UTC, to the millisecond. */
export function instant(name: string) {
  return datetime(name, { mode: "date", fsp: 3 });
}

/** JSON: MariaDB keeps it as text with a check, and hands it back as text. */
export function jsonOf<T>(name: string) {
  return customType<{ data: T; driverData: string }>({
    dataType: () => "json",
    toDriver: (value) => JSON.stringify(value),
    fromDriver: (stored) => (typeof stored === "string" ? JSON.parse(stored) : stored),
  })(name);
}

/** An id as the bytes raw SQL needs. */
export function uuidBytes(text: string): Buffer {
  return Buffer.from(text.replaceAll("-", ""), "hex");
}
