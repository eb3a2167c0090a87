import { QueryTypes, type Model, type ModelStatic } from "sequelize";
import { describe, expect, it } from "vitest";
import { db } from "@/models/database";
import { withTestDatabase } from "./test-database";

withTestDatabase();

/** What a column's type is called in PostgreSQL, by what the model calls it. */
const TYPES: Readonly<Record<string, string>> = {
  INTEGER: "int4",
  BIGINT: "int8",
  TEXT: "text",
  BOOLEAN: "bool",
  DATE: "timestamptz",
  DATEONLY: "date",
  UUID: "uuid",
  JSONB: "jsonb",
  CHAR: "bpchar",
};

interface Column {
  readonly table: string;
  readonly column: string;
  readonly type: string;
  /** Neither null nor a default: it must be said on inserting. */
  readonly mustBeSaid: boolean;
}

/** What Sequelize makes of a declared type: its key, and for an array the type of its members. */
interface TypeOfModel {
  readonly key: string;
  readonly type?: TypeOfModel;
}

function typeName({ key, type }: TypeOfModel): string {
  return key === "ARRAY" && type ? `_${typeName(type)}` : (TYPES[key] ?? key);
}

function models(): ModelStatic<Model>[] {
  return Object.values(db().sequelize.models);
}

function columnsOfModels(): Column[] {
  return models().flatMap((model) =>
    Object.values(model.getAttributes()).map((attribute) => {
      const mustBeSaid = attribute.allowNull === false && !attribute.autoIncrement;
      return { table: String(model.getTableName()), column: attribute.field ?? "", type: typeName(attribute.type as TypeOfModel), mustBeSaid };
    }),
  );
}

async function columnsOfTables(): Promise<Column[]> {
  return db().sequelize.query<Column>(
    `SELECT table_name AS "table", column_name AS "column", udt_name AS type,
            is_nullable = 'NO' AND column_default IS NULL AND is_identity = 'NO' AND is_generated = 'NEVER' AS "mustBeSaid"
       FROM information_schema.columns WHERE table_schema = 'public' AND table_name <> 'schema_migrations'`,
    { type: QueryTypes.SELECT },
  );
}

const lines = (columns: readonly Column[]) => columns.map(({ table, column, type }) => `${table}.${column} ${type}`).sort();

describe("the models", () => {
  it("have each table and each column with its type, and no other", async () => {
    expect(lines(columnsOfModels())).toEqual(lines(await columnsOfTables()));
  });

  it("demand what the database demands", async () => {
    const wanted = (columns: readonly Column[]) => columns.filter((each) => each.mustBeSaid).map(({ table, column }) => `${table}.${column}`).sort();
    expect(wanted(columnsOfModels())).toEqual(wanted(await columnsOfTables()));
  });

  it("carry names of their own, since the production build renames classes", () => {
    const properties = Object.keys(db()).filter((name) => name !== "sequelize");
    expect(Object.keys(db().sequelize.models).sort()).toEqual(properties.sort());
    for (const model of models()) expect(model.options.timestamps, model.name).toBe(false);
  });

  it("name each association, and read along each of them", async () => {
    for (const model of models()) {
      for (const [name, association] of Object.entries(model.associations)) {
        expect(association.as).toBe(name);
        await expect(model.findAll({ include: [{ association }], limit: 1 }), `${model.name}.${name}`).resolves.toEqual([]);
      }
    }
  });

  it("read bigints as numbers", async () => {
    const [row] = await db().sequelize.query<{ sum: unknown }>(`SELECT SUM(n)::bigint AS sum FROM generate_series(1, 100000) n`, { type: QueryTypes.SELECT });
    expect(row?.sum).toBe(5_000_050_000);
  });
});
