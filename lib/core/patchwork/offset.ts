import type { PlanePoint, Polygon } from "../piece/patch";
import { sidesOf, sideLength } from "./plane";

/**
 * The cut shape: each side of a finished shape moved outwards by the seam allowance, corners kept sharp however sharp
 * they are. For any simple polygon, clockwise on the screen, whose notches are wider than two seams. Lengths in 1/160 mm.
 */
export function offsetOutwards(finished: Polygon, seam: number): Polygon {
  const normals = sidesOf(finished).map((side): PlanePoint => {
    const long = sideLength(side);
    return [side[1] / long, -side[0] / long];
  });
  return finished.map(([x, y], index) => {
    const [ax, ay] = normals[(index + finished.length - 1) % finished.length] ?? [0, 0];
    const [bx, by] = normals[index] ?? [0, 0];
    // The point that lies `seam` outside both sides: along the sum of the normals, by seam / (1 + cos of their angle).
    const reach = seam / (1 + ax * bx + ay * by);
    return [x + (ax + bx) * reach, y + (ay + by) * reach];
  });
}
