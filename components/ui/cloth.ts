/** What a diagram needs to know of a fabric to be filled with it. */
export interface ClothTile {
  /** Names the pattern: a shape is filled with `clothFill(id)`. */
  readonly id: string;
  /** Address of the drawn tile under public/fabrics, such as /fabrics/ferry.svg; "" for a plain colour. */
  readonly tile: string;
  /** The fabric's own colour as #rrggbb: what shows where there is no tile, and until it has loaded. */
  readonly colour: string;
}

/** Repeats of the drawn tiles in pixels at life size on the screen, width by height. */
const REPEATS: Readonly<Record<string, readonly [width: number, height: number]>> = {
  bramble: [60, 60],
  brick: [18, 18],
  curd: [18, 18],
  ferry: [16, 16],
  flour: [54, 54],
  goose: [24, 24],
  hedge: [60, 60],
  heron: [6, 6],
  kiln: [90, 90],
  larder: [18, 18],
  madder: [40, 40],
  moss: [12, 12],
  osier: [56, 56],
  peat: [6, 6],
  salt: [48, 48],
  slack: [36, 18],
  toll: [50, 50],
  weld: [6, 6],
  wet: [90, 90],
};

/** A tile that the shop brings itself repeats at this size. */
const OTHER_REPEAT: readonly [number, number] = [64, 64];

/** The repeat of a tile by its address. */
export function clothRepeat(tile: string): readonly [width: number, height: number] {
  const name = /^\/fabrics\/([a-z0-9-]+)\.svg$/.exec(tile)?.[1];
  return (name === undefined ? undefined : REPEATS[name]) ?? OTHER_REPEAT;
}

/** The id of a fabric's pattern. Only letters, digits, "-" and "_" are kept, so that it can stand inside url(#…). */
export function clothPatternId(id: string): string {
  return `cloth-${id.replaceAll(/[^A-Za-z0-9_-]/g, "_")}`;
}

/** The fill of a shape cut from the fabric: give it to SVG's `fill`. */
export function clothFill(id: string): string {
  return `url(#${clothPatternId(id)})`;
}
