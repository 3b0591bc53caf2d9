/** The user that the app and the worker run as. It owns no DDL. */
export const appUser = "'withy_app'@'127.0.0.1'";

/** What the app may only add to and read: history that nobody edits. */
const appendOnly = new Set(["audit_events", "note_versions", "note_addenda", "card_events"]);

/** What the app may never delete from, because money or signed text hangs on it. */
const neverDeleted = new Set([
  "appointments",
  "appointment_changes",
  "patients",
  "notes",
  "letters",
  "measure_records",
  "invoice_counters",
  "payments",
  "refunds",
  "card_attempts",
  "programme_versions",
  "episodes",
  "courses",
  "class_sessions",
  "class_attendees",
  "leave_requests",
  "waiting_entries",
  "offer_rounds",
  "waiting_offers",
  "cover_plans",
  "cover_moves",
]);

/** One GRANT a table, so that a right that is not named here is not held. */
export function grantStatements(database: string, tables: readonly string[]): string[] {
  return tables
    .filter((table) => !table.startsWith("__"))
    .map((table) => {
      const rights = appendOnly.has(table)
        ? "SELECT, INSERT"
        : neverDeleted.has(table)
          ? "SELECT, INSERT, UPDATE"
          : "SELECT, INSERT, UPDATE, DELETE";
      return `GRANT ${rights} ON \`${database}\`.\`${table}\` TO ${appUser}`;
    });
}
