import { DEMO_ACCOUNTS } from "@/seeders/demo-people";

/** Prints who may sign in to the demo. */
const rows = DEMO_ACCOUNTS.map(({ email, password, roles, name }) => [email, password, `${roles.join(", ")} (${name})`]);
const widths = [0, 1].map((column) => Math.max(...rows.map((row) => row[column]?.length ?? 0)));
console.log("Demo accounts, with a password that everybody knows:");
for (const row of rows) console.log(`  ${row.map((cell, column) => cell.padEnd(widths[column] ?? 0)).join("  ")}`);
