/** The server's own error number, wherever the driver or the query builder wrapped it. */
export function errnoOf(error: unknown): number | null {
  let current: unknown = error;
  while (current instanceof Error) {
    if ("errno" in current && typeof current.errno === "number") return current.errno;
    current = current.cause;
  }
  return null;
}

function codeOf(error: unknown): string | null {
  let current: unknown = error;
  while (current instanceof Error) {
    if ("code" in current && typeof current.code === "string") return current.code;
    current = current.cause;
  }
  return null;
}

export const DUPLICATE_KEY = 1062;

/** Was it a record's own id that is taken, not another unique key? Only the text says which. */
export function isTakenId(error: unknown): boolean {
  let current: unknown = error;
  while (current instanceof Error) {
    if (errnoOf(current) === DUPLICATE_KEY && /for key 'PRIMARY'$/.test(current.message))
      return true;
    current = current.cause;
  }
  return false;
}

/** The row referred to is not there. */
export const FOREIGN_KEY = 1452;

/** Deadlock, lock wait, snapshot conflict, node not ready, certification failure. */
const TRANSIENT = new Set([1213, 1205, 1020, 1047, 1180]);
const LOST_CONNECTION = new Set([
  "PROTOCOL_CONNECTION_LOST",
  "ECONNRESET",
  "ECONNREFUSED",
  "EPIPE",
  "ETIMEDOUT",
]);

/** May the whole transaction be tried again? After a lost connection its outcome is unknown; ids make replay safe. */
export function mayRetry(error: unknown): boolean {
  const errno = errnoOf(error);
  if (errno !== null && TRANSIENT.has(errno)) return true;
  const code = codeOf(error);
  return code !== null && LOST_CONNECTION.has(code);
}
