/** Words of the command that adds a carrier. */
export const carrierAddText = {
  ask: {
    name: "The carrier's name: ",
    "manager-name": "Its manager's name: ",
    "manager-email": "The manager's e-mail address: ",
    yard: "The first yard's name: ",
    zone: "The yard's time zone, such as America/Denver: ",
    "elevation-m": "The yard's elevation, meters: ",
  },
  missing: (option: string) => `--${option} is not given.`,
  usage: (options: readonly string[]) =>
    `Options: ${options.map((option) => `--${option} <value>`).join(" ")}`,
  done: (email: string, origin: string) =>
    `Added. ${email} signs in at ${origin}/sign-in with a code sent by mail.`,
  broken: "The database did not take it. Is it up, and migrated?",
} as const;
