import { formatCentimetres, formatExactInches, formatInches, isOnThirtySecond, type MeasureSystem } from "../measure/format";
import { inches, length, type Length } from "../measure/length";
import type { CutPiece, CuttingRules } from "../piece/cut-piece";
import type { RoleId } from "../piece/drawing";
import type { PlanePoint, Polygon } from "../piece/patch";
import type { QuiltPiece } from "./quilt-piece";
import { cutHalfSquare, cutLongStrip, cutQuarterSquare, cutRectangle, sewnAsCut, type PieceHead } from "./quilt-strips";

export interface QuiltCutOptions {
  /** Roles of the quilt whose fabric has a direction that is kept. */
  readonly oneWay?: readonly RoleId[];
  /** The width that a role's fabric is planned on, selvages and shrinkage off; 40 in where nothing is said. */
  readonly usableWidth?: (role: RoleId) => Length;
  /** Borders out of strips across the fabric, joined where they must be, or whole and along the selvage. */
  readonly borders?: "across" | "along";
  /** How sizes are said in the pieces' names; inches where nothing is said. */
  readonly system?: MeasureSystem;
  /** Added to the squares of setting triangles and trimmed off the quilt; nothing where it is not said. */
  readonly settingOversize?: Length;
}

/** Common practice where a bolt says nothing else. */
export const USUAL_WIDTH: Length = inches(40);

/** Everything of the layout but the blocks' patches, as cut lines: small squares first, borders last. Letters from `letters`. */
export function settingPieces(pieces: readonly QuiltPiece[], rules: CuttingRules, options: QuiltCutOptions, letters: () => string): CutPiece[] {
  const cutter = { rules, options, letters, oneWay: new Set(options.oneWay ?? []), say: (units: number) => sizeName(units, options.system) };
  return [
    ...cornerstones(pieces, cutter),
    ...shortSashing(pieces, cutter),
    ...plainSquares(pieces, cutter),
    ...triangles(pieces, cutter),
    ...sashingRows(pieces, cutter),
    ...borders(pieces, cutter),
  ];
}

interface Cutter {
  readonly rules: CuttingRules;
  readonly options: QuiltCutOptions;
  readonly letters: () => string;
  readonly oneWay: ReadonlySet<RoleId>;
  readonly say: (units: number) => string;
}

type Kind = QuiltPiece["source"]["kind"];

function cornerstones(pieces: readonly QuiltPiece[], cutter: Cutter): CutPiece[] {
  const lines = byRole(pieces, "cornerstone").map(([role, group]) => {
    const side = shortSide(group[0]);
    return cutRectangle({ key: `cornerstone/${role}`, letter: cutter.letters(), name: `Cornerstone, ${cutter.say(side)}`, role }, { along: side, across: side }, group.length, !cutter.oneWay.has(role), cutter.rules);
  });
  const halved = byRole(pieces, "half-cornerstone").map(([role, group]) => {
    const long = longSide(group[0]);
    const head = { key: `half-cornerstone/${role}`, letter: cutter.letters(), name: `Half cornerstone at the edge, ${cutter.say(long)} long side`, role };
    return edgeTriangles(head, long, group, cutter, length(0));
  });
  return [...lines, ...halved];
}

/** Strips of one length are one line; in a one-way fabric those that lie down the quilt are another. */
function shortSashing(pieces: readonly QuiltPiece[], cutter: Cutter): CutPiece[] {
  const groups = grouped(ofKind(pieces, "sashing"), (piece) => {
    const lies = cutter.oneWay.has(piece.role) && piece.source.kind === "sashing" ? `/${piece.source.lies}` : "";
    return `sashing/${piece.role}/${Math.round(longSide(piece))}${lies}`;
  });
  return groups.map(([key, group]) => {
    const [first, width, long] = [group[0], shortSide(group[0]), longSide(group[0])];
    const oneWay = cutter.oneWay.has(first.role);
    const down = oneWay && first.source.kind === "sashing" && first.source.lies === "down";
    const head = { key, letter: cutter.letters(), name: `Sashing${down ? ", print along it" : oneWay ? ", print across it" : ""}, ${cutter.say(width)} × ${cutter.say(long)}`, role: first.role };
    return cutRectangle(head, down ? { along: long, across: width } : { along: width, across: long }, group.length, !oneWay, cutter.rules);
  });
}

function plainSquares(pieces: readonly QuiltPiece[], cutter: Cutter): CutPiece[] {
  return byRole(pieces, "plain").map(([role, group]) => {
    const [across, along] = [edge(group[0].polygon, 0), edge(group[0].polygon, 1)];
    const name = `Alternate plain ${Math.abs(across - along) < 1 ? `square, ${cutter.say(across)}` : `rectangle, ${cutter.say(across)} × ${cutter.say(along)}`}`;
    return cutRectangle({ key: `plain/${role}`, letter: cutter.letters(), name, role }, { along, across }, group.length, !cutter.oneWay.has(role), cutter.rules);
  });
}

function triangles(pieces: readonly QuiltPiece[], cutter: Cutter): CutPiece[] {
  const oversize = cutter.options.settingOversize ?? length(0);
  const sides = byRole(pieces, "setting-triangle").map(([role, group]) => {
    const long = longSide(group[0]);
    return edgeTriangles({ key: `setting-triangle/${role}`, letter: cutter.letters(), name: `Setting triangle, ${cutter.say(long)} long side`, role }, long, group, cutter, oversize);
  });
  const corners = byRole(pieces, "corner-triangle").map(([role, group]): CutPiece => {
    const short = longSide(group[0]) / Math.SQRT2;
    const head = { key: `corner-triangle/${role}`, letter: cutter.letters(), name: `Corner triangle, ${cutter.say(short)} short sides`, role };
    const line = cutHalfSquare(head, short, group.length, !cutter.oneWay.has(role), cutter.rules, oversize);
    return cutter.oneWay.has(role) ? { ...line, note: "One-way print: cut the two squares from opposite corners, one each way." } : line;
  });
  return [...sides, ...corners];
}

/**
 * A square cut twice gives one triangle for each side of the quilt. In a one-way fabric a triangle fits only its own
 * side, so the side that wants the most says how many squares there are.
 */
function edgeTriangles(head: PieceHead, long: number, group: readonly QuiltPiece[], cutter: Cutter, oversize: Length): CutPiece {
  if (!cutter.oneWay.has(head.role)) return cutQuarterSquare(head, long, group.length, true, cutter.rules, oversize);
  const most = Math.max(...grouped(group, (piece) => ("side" in piece.source ? piece.source.side : "")).map(([, side]) => side.length));
  const line = cutQuarterSquare(head, long, 4 * most, false, cutter.rules, oversize);
  return { ...line, note: `One-way print: each square gives one triangle for each side of the quilt; ${group.length} are used.` };
}

/** Strips between rows: whole where they fit across the fabric, otherwise one long run joined straight. */
function sashingRows(pieces: readonly QuiltPiece[], cutter: Cutter): CutPiece[] {
  return byRole(pieces, "sashing-row").flatMap(([role, group]) => longPieces({ key: `sashing-row/${role}`, letter: "Sashing", name: "Sashing between rows", role }, group, cutter, "across"));
}

/** Borders of one place, inside out; in a one-way fabric the sides are cut along the bolt. */
function borders(pieces: readonly QuiltPiece[], cutter: Cutter): CutPiece[] {
  const along = cutter.options.borders === "along";
  const only = new Set(pieces.flatMap(({ source }) => (source.kind === "border" ? [source.border] : []))).size === 1;
  const lines = grouped(ofKind(pieces, "border"), ({ source }) => (source.kind === "border" ? String(source.border) : "")).flatMap(([index, group]) => {
    const name = only ? "Border" : `Border ${Number(index) + 1}`;
    const role = group[0].role;
    const head = (part: string, said: string) => ({ key: `border-${Number(index) + 1}/${role}${part}`, letter: name, name: `${name}${said}`, role });
    if (!cutter.oneWay.has(role)) return longPieces(head("", along ? ", along the selvage" : ""), group, cutter, along ? "along" : "across");
    const [sides, ends] = [group.filter((piece) => isUpright(piece)), group.filter((piece) => !isUpright(piece))];
    return [...longPieces(head("/sides", ", sides, along the bolt"), sides, cutter, "along"), ...longPieces(head("/ends", ", top and bottom"), ends, cutter, "across")];
  });
  const corners = grouped(ofKind(pieces, "border-corner"), ({ role, source }) => `border-corner-${source.kind === "border-corner" ? source.border + 1 : ""}/${role}`).map(([key, group]) => {
    const [role, side] = [group[0].role, shortSide(group[0])];
    return cutRectangle({ key, letter: cutter.letters(), name: `Border corner, ${cutter.say(side)}`, role }, { along: side, across: side }, group.length, !cutter.oneWay.has(role), cutter.rules);
  });
  return [...lines, ...corners];
}

function isUpright({ source }: QuiltPiece): boolean {
  return source.kind === "border" && (source.side === "left" || source.side === "right");
}

/**
 * Whole pieces where each fits the way it is cut, else one run of their total length. An end that the quilt's edge cuts
 * at half a right angle has its seam s(1 + √2) further out along the longer side.
 */
function longPieces(head: PieceHead, group: readonly QuiltPiece[], cutter: Cutter, way: "across" | "along"): CutPiece[] {
  const { rules, options } = cutter;
  const width = group.length ? shortSide(group[0]) : 0;
  const slanted = group.some(hasSlantedEnds);
  const seams = 2 * rules.seamAllowance * (slanted ? 1 + Math.SQRT2 : 1);
  const room = (options.usableWidth ?? (() => USUAL_WIDTH))(head.role);
  const turnable = !cutter.oneWay.has(head.role) && way === "across";
  const whole = (long: number) => sewnAsCut(long, rules).ruler <= room;
  if (way === "along" || (!slanted && group.every((piece) => whole(longSide(piece))))) {
    return grouped(group, (piece) => String(Math.round(longSide(piece)))).map(([key, same]) => {
      const long = longSide(same[0]);
      const sized = { ...head, key: `${head.key}/${key}`, name: `${head.name}, ${cutter.say(width)} × ${cutter.say(long)}` };
      return cutRectangle(sized, way === "along" ? { along: long, across: width } : { along: width, across: long }, same.length, turnable, rules);
    });
  }
  const needed = group.reduce((total, piece) => total + longSide(piece) + seams, 0);
  return [cutLongStrip({ ...head, name: `${head.name}, ${cutter.say(width)} wide` }, sewnAsCut(width, rules), needed, "straight", rules)];
}

/** The ends of a strip are square when its shorter sides are as long as it is broad. */
function hasSlantedEnds(piece: QuiltPiece): boolean {
  const shortest = Math.min(...piece.polygon.map((_, index) => edge(piece.polygon, index)));
  return shortest > shortSide(piece) + 1;
}

function ofKind(pieces: readonly QuiltPiece[], kind: Kind): QuiltPiece[] {
  return pieces.filter((piece) => piece.source.kind === kind);
}

type Group = readonly [QuiltPiece, ...QuiltPiece[]];

function byRole(pieces: readonly QuiltPiece[], kind: Kind): [RoleId, Group][] {
  return grouped(ofKind(pieces, kind), (piece) => piece.role);
}

/** In order of first sight. */
function grouped(pieces: readonly QuiltPiece[], keyOf: (piece: QuiltPiece) => string): [string, Group][] {
  const groups = new Map<string, [QuiltPiece, ...QuiltPiece[]]>();
  for (const piece of pieces) {
    const group = groups.get(keyOf(piece));
    if (group) group.push(piece);
    else groups.set(keyOf(piece), [piece]);
  }
  return [...groups];
}

function edge(polygon: Polygon, index: number): number {
  const [from, to]: (PlanePoint | undefined)[] = [polygon[index], polygon[(index + 1) % polygon.length]];
  return from && to ? settled(Math.hypot(to[0] - from[0], to[1] - from[1])) : 0;
}

/** A measure that came out of square roots whole but for float noise is whole. */
function settled(units: number): number {
  const whole = Math.round(units);
  return Math.abs(units - whole) < 1e-6 ? whole : units;
}

function longSide(piece: QuiltPiece | undefined): number {
  return piece ? Math.max(...piece.polygon.map((_, index) => edge(piece.polygon, index))) : 0;
}

/** The breadth of a strip; of one whose ends are slanted it is square to the strip, not along its end. */
function shortSide(piece: QuiltPiece | undefined): number {
  return piece ? settled(areaOf(piece.polygon) / middleLength(piece.polygon)) : 0;
}

/** Mean of the two long sides of a four-sided piece: with the area it gives the breadth. */
function middleLength(polygon: Polygon): number {
  const sides = polygon.map((_, index) => edge(polygon, index));
  const [even, odd] = [(sides[0] ?? 0) + (sides[2] ?? 0), (sides[1] ?? 0) + (sides[3] ?? 0)];
  return Math.max(even, odd) / 2;
}

/** The area inside a polygon, above zero whichever way round it goes. */
export function areaOf(polygon: Polygon): number {
  const doubled = polygon.reduce((total, [x, y], index) => {
    const [u, v] = polygon[(index + 1) % polygon.length] ?? [x, y];
    return total + x * v - u * y;
  }, 0);
  return Math.abs(doubled) / 2;
}

/** "3 in", "12 1/2 in", "7.5 cm"; what lies between the marks of an inch ruler as a decimal: "4.243 in". */
export function sizeName(units: number, system: MeasureSystem = "yards"): string {
  if (system === "metres") return `${formatCentimetres(units)} cm`;
  const whole = Math.round(units);
  const onMark = Math.abs(units - whole) < 1e-6 && isOnThirtySecond(whole);
  return `${onMark ? formatInches(whole) : formatExactInches(units)} in`;
}
