import { createRequire } from "node:module";
import path from "node:path";
import { cruise, type ICruiseResult, type IForbiddenRuleType } from "dependency-cruiser";
import { beforeAll, describe, expect, it } from "vitest";

const TREE = path.resolve(import.meta.dirname, "../../fixtures/layers");

interface Config {
  readonly forbidden: readonly IForbiddenRuleType[];
  readonly options: Record<string, unknown>;
}

/** A tree with our rooms in small: every good file keeps the rules, every other one breaks the rule named beside it. */
const BROKEN: readonly (readonly [rule: string, file: string])[] = [
  ["core-measure", "lib/core/measure/bad.ts"],
  ["core-measure-no-node", "lib/core/measure/bad-node.ts"],
  ["core-money", "lib/core/money/bad.ts"],
  ["core-money-no-node", "lib/core/money/bad-node.ts"],
  ["core-codes", "lib/core/codes/bad.ts"],
  ["core-codes-no-node", "lib/core/codes/bad-node.ts"],
  ["core-policy", "lib/core/policy/bad.ts"],
  ["core-policy-no-node", "lib/core/policy/bad-node.ts"],
  ["core-piece", "lib/core/piece/bad.ts"],
  ["core-piece-no-node", "lib/core/piece/bad-node.ts"],
  ["core-patchwork", "lib/core/patchwork/bad.ts"],
  ["core-patchwork-no-node", "lib/core/patchwork/bad-node.ts"],
  ["core-cutting", "lib/core/cutting/bad.ts"],
  ["core-cutting-no-node", "lib/core/cutting/bad-node.ts"],
  ["core-kit", "lib/core/kit/bad.ts"],
  ["core-kit-no-node", "lib/core/kit/bad-node.ts"],
  ["core-files", "lib/core/bad.ts"],
  ["core-files-no-node", "lib/core/bad-node.ts"],
  ["core-room-unknown", "lib/core/somewhere/bad.ts"],
  ["input", "lib/input/bad.ts"],
  ["input-no-node", "lib/input/bad-node.ts"],
  ["data", "lib/data/bad.ts"],
  ["data-labels", "lib/data/bad-label.ts"],
  ["offline", "lib/offline/bad.ts"],
  ["offline-no-node", "lib/offline/bad-node.ts"],
  ["server", "lib/server/bad.ts"],
  ["lib-room-unknown", "lib/somewhere/bad.ts"],
  ["models", "models/bad.ts"],
  ["migrations", "migrations/bad.ts"],
  ["seeders", "seeders/bad.ts"],
  ["labels", "labels/bad.ts"],
  ["components", "components/bad.tsx"],
  ["components-no-node", "components/bad-node.tsx"],
  ["app", "app/bad.tsx"],
  ["models-only-from-data", "proxy.ts"],
  ["scripts-stay-outside", "instrumentation.ts"],
  ["scripts", "scripts/bad.ts"],
  ["tests-stay-outside", "bad.config.ts"],
  ["no-tool-in-production", "lib/server/bad-tool.ts"],
  ["no-unknown-module", "lib/server/bad-module.mjs"],
  ["no-cycle", "lib/server/circle-a.ts"],
];

describe("the layers", () => {
  const config = createRequire(import.meta.url)("../../../.dependency-cruiser.cjs") as Config;
  let violations: { rule: string; file: string }[] = [];

  beforeAll(async () => {
    // The tree has no aliases of its own, and its packages are those of the project.
    const { tsConfig: _, ...options } = config.options;
    const result = await cruise(["."], { ...options, baseDir: TREE, validate: true, ruleSet: { forbidden: [...config.forbidden] } });
    const { summary } = result.output as ICruiseResult;
    violations = summary.violations.map((each) => ({ rule: each.rule.name, file: each.from }));
  });

  it.each(BROKEN)("rule %s fires for %s", (rule, file) => {
    expect(violations).toContainEqual({ rule, file });
  });

  it("shows every rule to fire", () => {
    expect(config.forbidden.map((each) => each.name).sort()).toEqual(BROKEN.map(([rule]) => rule).sort());
  });

  it("lets the good files import what they need", () => {
    expect(violations.filter((each) => /(^|\/)(good|length|result)\.tsx?$/.test(each.file))).toEqual([]);
  });

  it("fires once for each broken file, so no rule stands in for another", () => {
    const extra = violations.filter(({ rule, file }) => !BROKEN.some(([name, broken]) => name === rule && broken === file) && !file.startsWith("lib/server/circle"));
    expect(extra).toEqual([]);
  });
});
