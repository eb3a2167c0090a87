/**
 * Which room may import what. A rule names everything that a room may import; anything else is a violation.
 * tests/unit/platform/layers.test.ts shows each rule to fire.
 */

/** Paths of installed packages, wherever node_modules lies. */
const packages = (...names) => names.map((name) => `(^|/)node_modules/(@types/)?${name}(/|\\.|$)`);
const core = (...rooms) => rooms.map((room) => `^lib/core/${room}/`);

/** Single files beside the rooms of the core: the Result type and the core's version. */
const CORE_FILES = "^lib/core/[^/]+\\.ts$";
const ALL_OF_CORE = "^lib/core/";
const INPUT = "^lib/input/";
const NEXT_FOR_COMPONENTS = packages("next/form", "next/link", "next/image", "next/navigation", "next/dynamic", "next/dist");

/** A rule: files under `from` import only themselves and what `may` names; node APIs only where `node` says so. */
function room(name, from, comment, may, { node = false } = {}) {
  const inside = { name, comment, severity: "error", from: { path: from }, to: { pathNot: [from, ...may], dependencyTypesNot: ["core"], couldNotResolve: false } };
  if (node) return [inside];
  return [inside, { name: `${name}-no-node`, comment: `${comment} Node's own modules are not among it: the browser runs this too.`, severity: "error", from: { path: from }, to: { dependencyTypes: ["core"] } }];
}

/** A rule: files under `from` import nothing that `never` names. */
function never(name, from, comment, to) {
  return { name, comment, severity: "error", from, to };
}

const NOTHING = "It stands on nothing but itself.";
const UPPER_ROOMS = "^(app|components|labels|models|migrations|seeders|scripts|tests)/";

const forbidden = [
  ...room("core-measure", "^lib/core/measure/", NOTHING, [CORE_FILES]),
  ...room("core-money", "^lib/core/money/", NOTHING, [CORE_FILES]),
  ...room("core-codes", "^lib/core/codes/", NOTHING, [CORE_FILES]),
  ...room("core-policy", "^lib/core/policy/", NOTHING, [CORE_FILES]),
  ...room("core-piece", "^lib/core/piece/", "The plain types stand on lengths.", [CORE_FILES, ...core("measure")]),
  ...room("core-patchwork", "^lib/core/patchwork/", "Patchwork knows lengths and the plain types.", [CORE_FILES, ...core("measure", "piece")]),
  ...room("core-cutting", "^lib/core/cutting/", "Cutting knows lengths, the plain types and the solver.", [CORE_FILES, ...core("measure", "piece"), ...packages("highs")]),
  ...room("core-kit", "^lib/core/kit/", "A kit knows the rooms of the core below it.", [CORE_FILES, ...core("measure", "money", "piece", "patchwork", "cutting")]),
  ...room("core-files", CORE_FILES, NOTHING, []),
  never("core-room-unknown", { path: ALL_OF_CORE, pathNot: [CORE_FILES, ...core("measure", "money", "piece", "patchwork", "cutting", "kit", "codes", "policy")] }, "A new room of the core needs a rule of its own.", {}),

  ...room("input", INPUT, "What a request may hold is checked with zod, and speaks of the core's types.", [ALL_OF_CORE, ...packages("zod")]),
  ...room("data", "^lib/data/", "The data layer knows the core and the models, and no page.", [ALL_OF_CORE, INPUT, "^models/", "^labels/", ...packages("sequelize", "pg", "zod", "@node-rs/argon2")], { node: true }),
  never("data-labels", { path: "^lib/data/" }, "The data layer fills in what a document says; drawing it is the server's.", { path: "^labels/", dependencyTypesNot: ["type-only"] }),
  ...room("offline", "^lib/offline/", "The browser's queue knows the core.", [ALL_OF_CORE, INPUT, ...packages("idb", "zod")]),
  never("server", { path: "^lib/server/" }, "The server's doors know the core, the data layer and the labels.", { path: [UPPER_ROOMS, "^lib/offline/"], pathNot: "^labels/" }),
  never("lib-room-unknown", { path: "^lib/", pathNot: "^lib/(core|input|data|server|offline)/" }, "A new room of lib needs a rule of its own.", {}),

  ...room("models", "^models/", "Models know the core and Sequelize.", [ALL_OF_CORE, ...packages("sequelize", "pg")], { node: true }),
  ...room("migrations", "^migrations/", "A migration stays as it was written, so it knows nothing that changes.", packages("pg", "umzug"), { node: true }),
  ...room("seeders", "^seeders/", "The seed goes through the data layer.", [ALL_OF_CORE, INPUT, "^lib/data/", "^models/", ...packages("sequelize", "pg", "highs")], { node: true }),
  ...room("labels", "^labels/", "Labels are plain data made into PDF.", [ALL_OF_CORE, "^fonts/", ...packages("pdfkit", "bwip-js")], { node: true }),
  ...room("components", "^components/", "Components get props and give callbacks.", [ALL_OF_CORE, INPUT, ...NEXT_FOR_COMPONENTS, ...packages("react", "react-dom", "@tanstack/[^/]+", "react-hook-form", "@hookform/resolvers", "zod")]),
  never("app", { path: "^app/" }, "Pages know lib, labels and components.", { path: "^(models|migrations|seeders|scripts|tests)/" }),

  never("models-only-from-data", { pathNot: "^(models|lib/data|seeders|scripts|tests)/" }, "Only the data layer reads and writes.", { path: "^models/" }),
  never("scripts-stay-outside", { pathNot: "^(scripts|tests)/" }, "What runs in production imports no script.", { path: "^scripts/" }),
  never("scripts", { path: "^scripts/" }, "Scripts know the data, never the pages.", { path: "^(app|components)/" }),
  never("tests-stay-outside", { pathNot: "^tests/" }, "Nothing imports a test.", { path: "^tests/" }),
  never("no-tool-in-production", { path: "^(app|components|lib|labels|models|migrations|seeders)/" }, "What production needs is a dependency, not a tool of development.", { dependencyTypes: ["npm-dev"], dependencyTypesNot: ["type-only"] }),
  never("no-unknown-module", {}, "Every import leads somewhere.", { couldNotResolve: true }),
  never("no-cycle", {}, "Files that import each other in a circle cannot be read one at a time.", { circular: true, viaOnly: { dependencyTypesNot: ["type-only"] } }),
];

module.exports = {
  forbidden,
  options: {
    doNotFollow: { path: "node_modules" },
    exclude: { path: "(^|/)(\\.next|build|\\.ellwand)/" },
    tsPreCompilationDeps: true,
    tsConfig: { fileName: "tsconfig.json" },
    combinedDependencies: false,
    enhancedResolveOptions: { exportsFields: ["exports"], conditionNames: ["import", "require", "node", "default", "types"], mainFields: ["module", "main", "types", "typings"] },
  },
};
