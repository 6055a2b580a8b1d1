/** Tables whose rows are never changed or deleted (K3); triggers refuse it too. */
const APPEND_ONLY = [
  "policies",
  "dated_tests",
  "rounds",
  "sheet_versions",
  "walks",
  "answers",
  "readings",
  "tag_changes",
  "sign_offs",
  "run_limits",
  "acknowledgements",
  "runs",
  "returns",
  "receipts",
  "conflicts",
  "changes",
  "audit",
];
/** Rows that may be filled in or changed, never deleted. */
const CHANGEABLE = [
  "carriers",
  "feed_heads",
  "yards",
  "handovers",
  "invitations",
  "mail_outbox",
  "memberships",
  "people",
  "photos",
  "tags",
  "fittings",
  "own_checks",
  "set_points",
  "trucks",
];
/** Housekeeping rows that may be removed. */
const REMOVABLE = ["sessions", "sign_in_codes", "rate_limits", "leases", "clearances"];

/**
 * The rights of the app's database user: no DELETE on anything that was signed, no DDL at all.
 * @param {string} database
 * @param {string} user quoted account, as 'name'@'host'
 * @returns {string[]} one statement each
 */
export function grants(database, user) {
  const on = (rights) => (table) => `GRANT ${rights} ON \`${database}\`.\`${table}\` TO ${user}`;
  return [
    ...APPEND_ONLY.map(on("SELECT, INSERT")),
    ...CHANGEABLE.map(on("SELECT, INSERT, UPDATE")),
    ...REMOVABLE.map(on("SELECT, INSERT, UPDATE, DELETE")),
  ];
}
