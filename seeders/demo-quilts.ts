import { inches } from "../lib/core/measure/length";
import type { StoredQuilt } from "../lib/input/quilt";

/** The demo's quilts and kits, all invented. Block slugs are those of the traditional library. */
export interface DemoKit {
  readonly name: string;
  readonly quilt: (versionOf: (slug: string) => number) => StoredQuilt;
  readonly notions: readonly { readonly number: string; readonly count: number }[];
  readonly labourMinutes: number;
  readonly colourways: readonly { readonly name: string; readonly price: number; readonly fabrics: Readonly<Record<string, string>> }[];
}

const BINDING = { stripWidth: inches(2.5), extra: inches(10) };

export const DEMO_KITS: readonly DemoKit[] = [
  {
    name: "Weir Pool",
    quilt: (versionOf) => ({
      setting: "straight",
      rows: 5,
      columns: 4,
      blocks: [{ blockVersionId: versionOf("clays-choice"), roles: { corner: "corners", wheel: "wheel", sky: "sky", hub: "hub" } }],
      cells: Array.from({ length: 20 }, () => ({ kind: "block" as const, block: 0, turn: 0 as const })),
      sashing: { width: inches(2), role: "sashing", cornerstones: "hub", allRound: true },
      borders: [{ width: inches(4), role: "border", corners: null }],
      binding: { ...BINDING, role: "wheel" },
      backing: null,
      roles: [
        { id: "wheel", name: "Wheel arms and binding", value: "dark" },
        { id: "sky", name: "Sky", value: "light" },
        { id: "hub", name: "Wheel hub and cornerstones", value: "dark" },
        { id: "corners", name: "Corners", value: "medium" },
        { id: "sashing", name: "Sashing", value: "light" },
        { id: "border", name: "Border", value: "medium" },
      ],
    }),
    notions: [{ number: "N-102", count: 1 }],
    labourMinutes: 12,
    colourways: [
      { name: "Ferry Crossing", price: 9400, fabrics: { wheel: "ferry", sky: "flour", hub: "madder", corners: "osier", sashing: "slack", border: "toll" } },
      { name: "Kiln Light", price: 9600, fabrics: { wheel: "peat", sky: "salt", hub: "kiln", corners: "curd", sashing: "larder", border: "brick" } },
    ],
  },
  {
    name: "Heron Steps",
    quilt: (versionOf) => ({
      setting: "straight",
      rows: 4,
      columns: 3,
      blocks: [{ blockVersionId: versionOf("sawtooth-star"), roles: { dark: "star", light: "ground" } }],
      cells: Array.from({ length: 12 }, (_, index) =>
        (index + Math.floor(index / 3)) % 2 === 0 ? { kind: "block" as const, block: 0, turn: 0 as const } : { kind: "plain" as const, role: "plain" },
      ),
      sashing: null,
      borders: [{ width: inches(3), role: "ground", corners: "star" }],
      binding: { ...BINDING, role: "star" },
      backing: null,
      roles: [
        { id: "star", name: "Stars, border corners and binding", value: "dark" },
        { id: "ground", name: "Ground and border", value: "light" },
        { id: "plain", name: "Plain squares", value: "medium" },
      ],
    }),
    notions: [{ number: "N-101", count: 1 }],
    labourMinutes: 8,
    colourways: [
      { name: "Slate and Salt", price: 5800, fabrics: { star: "moss", ground: "salt", plain: "wet" } },
      { name: "Plain Weld", price: 5600, fabrics: { star: "peat", ground: "hedge", plain: "weld" } },
    ],
  },
];
