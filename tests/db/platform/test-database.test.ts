import { QueryTypes } from "sequelize";
import { describe, expect, it } from "vitest";
import { db } from "@/models/database";
import { withTestDatabase } from "../test-database";

describe("the database of a test file", () => {
  const database = withTestDatabase();

  it("is its own, migrated and empty", async () => {
    const [row] = await db().sequelize.query<{ name: string; migrations: number; people: number }>(
      "SELECT current_database() AS name, (SELECT count(*)::int FROM schema_migrations) AS migrations, (SELECT count(*)::int FROM people) AS people",
      { type: QueryTypes.SELECT },
    );
    expect(row?.name).toBe(new URL(database.url).pathname.slice(1));
    expect(row?.migrations).toBeGreaterThan(0);
    expect(row?.people).toBe(0);
  });
});
