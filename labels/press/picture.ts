import { drawHatch, type Box, type Hatch } from "./hatch";
import type { Press } from "./press";

export interface PicturePolygon {
  readonly points: readonly (readonly [x: number, y: number])[];
  /** The fabric's ground, as #rrggbb. */
  readonly colour: string;
  readonly hatch: Hatch;
}

/** A quilt, block or patch in any unit; x to the right, y downwards, the picture's own top left at (0, 0). */
export interface Picture {
  readonly width: number;
  readonly height: number;
  readonly polygons: readonly PicturePolygon[];
}

export interface PictureStyle {
  /** "ink" is pure black and white; "colour" fills with the fabric's ground and hatches faintly over it. */
  readonly as: "ink" | "colour";
  /** Points. */
  readonly lineWidth: number;
  /** Points from line to line; 0 leaves the hatch out. */
  readonly hatchStep: number;
  readonly hatchWidth: number;
  readonly frameWidth: number;
}

/** The largest box of the picture's own shape inside `room`, at its top left. */
export function fitPicture(picture: Picture, room: Box): Box {
  const scale = Math.min(room.width / picture.width, room.height / picture.height);
  return { x: room.x, y: room.y, width: picture.width * scale, height: picture.height * scale };
}

/** Draws the picture to fill `box`, fabric by fabric, so that each hatch runs through the whole quilt. */
export function drawPicture(press: Press, picture: Picture, box: Box, style: PictureStyle): void {
  const { doc } = press;
  const scale = box.width / picture.width;
  const groups = new Map<string, PicturePolygon[]>();
  for (const polygon of picture.polygons) {
    if (polygon.points.length < 3) continue;
    const key = `${polygon.hatch} ${style.as === "ink" ? "" : polygon.colour}`;
    groups.set(key, [...(groups.get(key) ?? []), polygon]);
  }
  doc.save();
  // Room for half the outline, which lies on the picture's edge.
  const edge = style.lineWidth / 2;
  doc.rect(box.x - edge, box.y - edge, box.width + 2 * edge, box.height + 2 * edge).clip();
  for (const polygons of groups.values()) {
    const [first] = polygons;
    if (!first) continue;
    doc.save();
    trace(press, polygons, box, scale);
    if (style.as === "colour") {
      doc.fill(inkColour(first.colour));
      trace(press, polygons, box, scale);
    }
    doc.clip();
    const colour = style.as === "ink" ? "#000000" : hatchColour(first.colour);
    const hatch = style.hatchStep <= 0 || (style.as === "colour" && first.hatch === "solid") ? "blank" : first.hatch;
    drawHatch(press, hatch, box, { colour, lineWidth: style.hatchWidth, step: style.hatchStep });
    doc.restore();
  }
  if (style.lineWidth > 0) {
    trace(press, picture.polygons, box, scale);
    doc.lineWidth(style.lineWidth).lineJoin("round").strokeColor("#000000").stroke();
  }
  doc.restore();
  if (style.frameWidth > 0) {
    doc.rect(box.x, box.y, box.width, box.height).lineWidth(style.frameWidth).lineJoin("miter").strokeColor("#000000").stroke();
  }
}

function trace({ doc }: Press, polygons: readonly PicturePolygon[], box: Box, scale: number): void {
  for (const { points } of polygons) {
    points.forEach(([x, y], i) => {
      if (i === 0) doc.moveTo(box.x + x * scale, box.y + y * scale);
      else doc.lineTo(box.x + x * scale, box.y + y * scale);
    });
    doc.closePath();
  }
}

/** A colour that is not #rrggbb prints as paper rather than stopping the sheet. */
export function inkColour(colour: string): string {
  return /^#[0-9a-f]{6}$/i.test(colour) ? colour : "#ffffff";
}

/** 0 black to 1 white, by the eye (Rec. 709 weights on the coded values; enough to choose an ink). */
export function lightness(colour: string): number {
  const value = Number.parseInt(inkColour(colour).slice(1), 16);
  return (0.2126 * (value >> 16) + 0.7152 * ((value >> 8) & 255) + 0.0722 * (value & 255)) / 255;
}

/** Dark lines on light cloth, light lines on dark cloth, so that the hatch also shows without colour. */
function hatchColour(colour: string): string {
  return lightness(colour) > 0.45 ? "#3a3631" : "#ffffff";
}
