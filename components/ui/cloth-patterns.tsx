import { clothPatternId, clothRepeat, type ClothTile } from "./cloth";

interface ClothPatternsProps {
  readonly fabrics: readonly ClothTile[];
  /** User units a pixel of the tile; a drawing in inches whose picture has 8 px an inch asks for 1/8. */
  readonly scale?: number;
}

/**
 * The cloths of a page, once, for every drawing on it: fill with `url(#cloth-…)`. The tile is drawn one unit over each
 * edge on the fabric's colour, so that no hairline shows between repeats, and stays a drawing on the screen and in print.
 */
export function ClothPatterns({ fabrics, scale = 1 }: ClothPatternsProps) {
  return (
    <svg width="0" height="0" style={{ position: "absolute" }} aria-hidden="true" focusable="false">
      <defs>
        {distinct(fabrics).map((fabric) => (
          <ClothPattern key={fabric.id} fabric={fabric} scale={scale} />
        ))}
      </defs>
    </svg>
  );
}

/** One fabric's pattern, for a drawing that carries its own definitions. */
export function ClothPattern({ fabric, scale = 1, id }: { fabric: ClothTile; scale?: number; id?: string }) {
  const [width, height] = clothRepeat(fabric.tile);
  return (
    <pattern id={id ?? clothPatternId(fabric.id)} width={width} height={height} patternUnits="userSpaceOnUse" patternTransform={scale === 1 ? undefined : `scale(${scale})`}>
      <rect x={-1} y={-1} width={width + 2} height={height + 2} fill={fabric.colour} />
      {fabric.tile === "" ? null : <image href={fabric.tile} width={width} height={height} preserveAspectRatio="xMidYMid slice" />}
    </pattern>
  );
}

function distinct(fabrics: readonly ClothTile[]): readonly ClothTile[] {
  return [...new Map(fabrics.map((fabric) => [fabric.id, fabric])).values()];
}
