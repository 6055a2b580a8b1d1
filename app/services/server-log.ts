import { log } from "./log";

/** The log as the outer server uses it. */
export const serverLog = {
  info: (detail: object, message: string) => log().info(detail, message),
  error: (detail: object, message: string) => log().error(detail, message),
};
