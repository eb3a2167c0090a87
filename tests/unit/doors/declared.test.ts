import { readFileSync, readdirSync } from "node:fs";
import path from "node:path";
import ts from "typescript";
import { describe, expect, it } from "vitest";
import { PERMISSIONS } from "@/lib/core/policy/policy";

/** Exports that stand outside the doors, each with its reason. */
const OPEN: Readonly<Record<string, string>> = {
  "app/api/auth/[...nextauth]/route.ts GET": "next-auth's own handler signs people in and out",
  "app/api/auth/[...nextauth]/route.ts POST": "next-auth's own handler signs people in and out, with its own token",
  "app/api/health/route.ts GET": "says only whether the server reaches its database",
};

const PAGES_FOR_ANYONE = new Set(["app/page.tsx", "app/sign-in/page.tsx", "app/join/page.tsx", "app/setup/page.tsx"]);
const ROOT = path.resolve(import.meta.dirname, "../../..");
const METHODS = new Set(["GET", "HEAD", "POST", "PUT", "PATCH", "DELETE"]);

interface Declared {
  readonly name: string;
  /** A permission, "open", or null when the export went through no door. */
  readonly permission: string | null;
}

const files = readdirSync(path.join(ROOT, "app"), { recursive: true, encoding: "utf8" }).map((file) => path.posix.join("app", file.replaceAll(path.sep, "/")));
const routes = files.filter((file) => file.endsWith("/route.ts"));
const actions = files.filter((file) => /\.tsx?$/.test(file) && /^\s*"use server";/.test(read(file)));
const pages = files.filter((file) => file.endsWith("page.tsx"));

describe("every door says who may pass", () => {
  it("finds the doors", () => {
    expect(routes.length).toBeGreaterThan(10);
    expect(pages.length).toBeGreaterThan(5);
  });

  it.each(routes)("%s", (file) => {
    for (const { name, permission } of declaredIn(file, "route").filter((each) => METHODS.has(each.name))) expectDeclared(`${file} ${name}`, permission);
  });

  it.each(actions)("%s", (file) => {
    for (const { name, permission } of declaredIn(file, "action")) expectDeclared(`${file} ${name}`, permission);
  });

  it.each(pages.filter((page) => !PAGES_FOR_ANYONE.has(page)))("%s", (file) => {
    const named = [...read(file).matchAll(/requireActor\("([^"]+)"\)/g)].map((match) => match[1]);
    expect(named, `${file} begins with requireActor("…")`).not.toEqual([]);
    for (const permission of named) expect(PERMISSIONS).toContain(permission);
  });
});

it("sees an export that goes round the doors", () => {
  expect(declaredFrom("export async function POST() { return Response.json(1); }", "route")).toEqual([{ name: "POST", permission: null }]);
  expect(declaredFrom('export const POST = route(schema, "bolt.see", work);', "route")).toEqual([{ name: "POST", permission: "bolt.see" }]);
  expect(declaredFrom("export const join = openAction(schema, work);", "action")).toEqual([{ name: "join", permission: "open" }]);
});

function expectDeclared(subject: string, permission: string | null): void {
  if (OPEN[subject]) return;
  expect(permission, `${subject} goes through a door and names its permission`).not.toBeNull();
  if (permission !== "open") expect(PERMISSIONS).toContain(permission);
}

function declaredIn(file: string, door: "route" | "action"): Declared[] {
  return declaredFrom(read(file), door);
}

function declaredFrom(text: string, door: "route" | "action"): Declared[] {
  const source = ts.createSourceFile("door.ts", text, ts.ScriptTarget.ES2022, true);
  return source.statements.flatMap((statement) => {
    if (ts.isExportDeclaration(statement) && statement.exportClause && ts.isNamedExports(statement.exportClause) && !statement.isTypeOnly) {
      return statement.exportClause.elements.map((element) => ({ name: element.name.text, permission: null }));
    }
    if (!ts.canHaveModifiers(statement) || !ts.getModifiers(statement)?.some((modifier) => modifier.kind === ts.SyntaxKind.ExportKeyword)) return [];
    if (ts.isFunctionDeclaration(statement)) return [{ name: statement.name?.text ?? "default", permission: null }];
    if (!ts.isVariableStatement(statement)) return [];
    return statement.declarationList.declarations.map((declaration) => ({ name: declaration.name.getText(source), permission: permissionOf(declaration.initializer, door) }));
  });
}

function permissionOf(value: ts.Expression | undefined, door: "route" | "action"): string | null {
  if (!value || !ts.isCallExpression(value) || !ts.isIdentifier(value.expression)) return null;
  if (door === "action" && value.expression.text === "openAction") return "open";
  if (value.expression.text !== door) return null;
  const permission = value.arguments[1];
  return permission && ts.isStringLiteral(permission) ? permission.text : null;
}

function read(file: string): string {
  return readFileSync(path.join(ROOT, file), "utf8");
}
