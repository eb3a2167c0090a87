import type { Box, Hatch } from "../press/hatch";
import { drawPicture } from "../press/picture";
import type { Press } from "../press/press";

/** A scrap of the fabric beside its name: its ground and the hatch that stands for it without colour. */
export function drawSwatch(press: Press, fabric: { readonly colour: string; readonly hatch: Hatch }, box: Box): void {
  const picture = {
    width: box.width,
    height: box.height,
    polygons: [{ points: [[0, 0], [box.width, 0], [box.width, box.height], [0, box.height]] as const, colour: fabric.colour, hatch: fabric.hatch }],
  };
  drawPicture(press, picture, box, { as: "colour", lineWidth: 0, hatchStep: 4, hatchWidth: 0.5, frameWidth: 0.9 });
}
