import type { CellDrawing } from "./cells";

/** Blocks of squares, strips and half-square triangles, drawn by us from the traditional patterns. */
export const SQUARE_BLOCKS: Readonly<Record<string, CellDrawing>> = {
  "four-patch": { rows: ["a b", "b a"], roles: { a: "light", b: "dark" } },
  "nine-patch": { rows: ["a b a", "b a b", "a b a"], roles: { a: "dark", b: "light" } },
  "rail-fence": { rows: ["a a a", "b b b", "c c c"], roles: { a: "light", b: "medium", c: "dark" }, joined: [[0, 0, 3, 1], [0, 1, 3, 1], [0, 2, 3, 1]] },
  "log-cabin": {
    rows: ["a a a a a a b", "a a a a a b b", "a a a a b b b", "a a a c b b b", "a a b b b b b", "a b b b b b b", "b b b b b b b"],
    roles: { a: "light", b: "dark", c: "hearth" },
    joined: [[2, 2, 1, 2], [2, 4, 2, 1], [4, 2, 1, 3], [2, 1, 3, 1], [1, 1, 1, 4], [1, 5, 4, 1], [5, 1, 1, 5], [1, 0, 5, 1], [0, 0, 1, 6], [0, 6, 6, 1], [6, 0, 1, 7]],
  },
  "shoo-fly": { rows: ["b/a b b\\a", "b a b", "a\\b b a/b"], roles: { a: "dark", b: "light" } },
  "churn-dash": {
    rows: ["b/a b b\\a", "a b a", "a\\b a a/b"],
    roles: { a: "dark", b: "light" },
    seams: [[1, 0.5, 2, 0.5], [1, 2.5, 2, 2.5], [0.5, 1, 0.5, 2], [2.5, 1, 2.5, 2]],
    paints: [[1.5, 0.25, "b"], [1.5, 0.75, "a"], [1.5, 2.25, "a"], [1.5, 2.75, "b"], [0.25, 1.5, "b"], [0.75, 1.5, "a"], [2.25, 1.5, "a"], [2.75, 1.5, "b"]],
  },
  "friendship-star": { rows: ["b a\\b b", "a/b a b/a", "b b\\a b"], roles: { a: "dark", b: "light" } },
  pinwheel: { rows: ["a\\b b/a", "a/b b\\a"], roles: { a: "dark", b: "light" } },
  "broken-dishes": { rows: ["a/b a\\b a/b a\\b", "b\\a b/a b\\a b/a", "a/b a\\b a/b a\\b", "b\\a b/a b\\a b/a"], roles: { a: "dark", b: "light" } },
  "clays-choice": {
    rows: ["a b\\c c/b a", "c/b d\\b b/d b\\c", "b\\c d/b b\\d c/b", "a b/c c\\b a"],
    roles: { a: "corner", b: "wheel", c: "sky", d: "hub" },
  },
  "jacobs-ladder": {
    rows: ["a b c c a b", "b a c c b a", "c c a b c c", "c c b a c c", "a b c c a b", "b a c c b a"],
    roles: { a: "light", b: "dark", c: "light", d: "dark" },
    joined: [[2, 0, 2, 2], [0, 2, 2, 2], [4, 2, 2, 2], [2, 4, 2, 2]],
    seams: [[2, 2, 4, 0], [0, 4, 2, 2], [4, 4, 6, 2], [2, 6, 4, 4]],
    paints: [[2.5, 0.5, "c"], [3.5, 1.5, "d"], [0.5, 2.5, "c"], [1.5, 3.5, "d"], [4.5, 2.5, "c"], [5.5, 3.5, "d"], [2.5, 4.5, "c"], [3.5, 5.5, "d"]],
  },
  "bear-paw": {
    rows: ["b b/a b/a c b\\a b\\a b", "b/a a a c a a b\\a", "b/a a a c a a b\\a", "c c c a c c c", "a\\b a a c a a a/b", "a\\b a a c a a a/b", "b a\\b a\\b c a/b a/b b"],
    roles: { a: "dark", b: "light", c: "light" },
    joined: [[1, 1, 2, 2], [4, 1, 2, 2], [1, 4, 2, 2], [4, 4, 2, 2], [3, 0, 1, 3], [0, 3, 3, 1], [4, 3, 3, 1], [3, 4, 1, 3]],
  },
};
