// Makes a carrier with its first yard and manager. What is not given as an option is asked for:
// npm run carrier:add -- --name "…" --manager-name "…" --manager-email … --yard "…" --zone America/Denver --elevation-m 1600
import { createInterface } from "node:readline/promises";
import { parseArgs } from "node:util";
import { ConfigError, config } from "~/config";
import { openDatabase } from "~/db/client";
import { addCarrier, addCarrierSchema } from "~/domain/carriers/add-carrier";
import { carrierAddText } from "~/text/en/carrier-add";
import { refusalText } from "~/text/en/refusals";

const OPTIONS = {
  name: "name",
  "manager-name": "managerName",
  "manager-email": "managerEmail",
  yard: "yard",
  zone: "zone",
  "elevation-m": "elevationM",
} as const;
type Option = keyof typeof OPTIONS;
const names = Object.keys(OPTIONS) as Option[];

/** Ends the command with what is wrong, on standard error. */
function fail(lines: readonly string[]): never {
  console.error(lines.join("\n"));
  process.exit(1);
}

function readOptions(): Partial<Record<Option, string>> {
  try {
    const options = Object.fromEntries(names.map((name) => [name, { type: "string" as const }]));
    return parseArgs({ options }).values;
  } catch (error) {
    fail([error instanceof Error ? error.message : String(error), carrierAddText.usage(names)]);
  }
}

async function askForMissing(given: Partial<Record<Option, string>>) {
  const missing = names.filter((name) => given[name] === undefined);
  if (missing.length === 0) return given;
  if (!process.stdin.isTTY) fail(missing.map((name) => carrierAddText.missing(name)));
  const terminal = createInterface({ input: process.stdin, output: process.stdout });
  const answers = { ...given };
  for (const name of missing) answers[name] = await terminal.question(carrierAddText.ask[name]);
  terminal.close();
  return answers;
}

try {
  const given = await askForMissing(readOptions());
  const named = Object.fromEntries(names.map((name) => [OPTIONS[name], given[name]]));
  const parsed = addCarrierSchema.safeParse(named);
  if (!parsed.success) {
    const options = Object.fromEntries(names.map((name) => [OPTIONS[name] as string, name]));
    fail(
      parsed.error.issues.map(
        ({ path, message }) => `--${options[String(path[0])]}: ${refusalText.field(message)}`,
      ),
    );
  }
  const database = openDatabase(config().databaseUrl, 1);
  const added = await addCarrier(database.db, parsed.data);
  await database.close();
  if (!added.ok) fail([refusalText.title(added.refusal.code)]);
  console.log(carrierAddText.done(parsed.data.managerEmail, config().publicOrigin));
} catch (error) {
  fail([error instanceof ConfigError ? error.message : carrierAddText.broken]);
}
