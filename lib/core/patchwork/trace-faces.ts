import { add, isZero, multiply, sign, subtract, ZERO, type Exact } from "./exact";
import { cross, dot, keyOf, minus, type Vector } from "./exact-point";

export interface TracedFaces {
  /** Clockwise on the screen, with straight-through points. */
  readonly faces: readonly (readonly Vector[])[];
  readonly openEnds: readonly Vector[];
  readonly islands: readonly Vector[];
  readonly vertices: readonly { readonly point: Vector; readonly degree: number }[];
}

interface Vertex {
  readonly point: Vector;
  /** Keys of the vertices that an edge leads to. */
  readonly next: Set<string>;
}

type Graph = Map<string, Vertex>;

/**
 * Walks the faces of a connected set of edges that meet only at their ends and hold the outside edge of the unit square.
 * Edges that bound no face on one of their sides (open ends, islands, bridges to islands) are told and left out.
 */
export function traceFaces(edges: readonly (readonly [Vector, Vector])[]): TracedFaces {
  const graph = graphOf(edges);
  const openEnds = pruneOpenEnds(graph);
  const islands = dropIslands(graph);
  for (;;) {
    const walks = walkAll(graph);
    const bridges = bridgesIn(walks);
    if (bridges.length === 0) {
      const faces = walks.filter((walk) => sign(doubleArea(walk)) > 0);
      const vertices = [...graph.values()].map((vertex) => ({ point: vertex.point, degree: vertex.next.size }));
      return { faces, openEnds, islands, vertices };
    }
    for (const [from, to] of bridges) disconnect(graph, from, to);
    pruneOpenEnds(graph);
    islands.push(...dropIslands(graph));
  }
}

function graphOf(edges: readonly (readonly [Vector, Vector])[]): Graph {
  const graph: Graph = new Map();
  const vertexOf = (point: Vector) => {
    const key = keyOf(point);
    const known = graph.get(key) ?? { point, next: new Set<string>() };
    graph.set(key, known);
    return { key, vertex: known };
  };
  for (const [from, to] of edges) {
    const [a, b] = [vertexOf(from), vertexOf(to)];
    a.vertex.next.add(b.key);
    b.vertex.next.add(a.key);
  }
  return graph;
}

/** Takes away edges with a loose end, one after the other, and returns where the loose ends were first found. */
function pruneOpenEnds(graph: Graph): Vector[] {
  const open: Vector[] = [];
  const queue = [...graph].filter(([, vertex]) => vertex.next.size === 1).map(([key]) => key);
  for (const key of queue) open.push(...(graph.get(key) ? [graph.get(key)?.point].filter((point) => point !== undefined) : []));
  while (queue.length) {
    const key = queue.pop() ?? "";
    const vertex = graph.get(key);
    if (!vertex || vertex.next.size !== 1) continue;
    const [other = ""] = vertex.next;
    disconnect(graph, key, other);
    if (graph.get(other)?.next.size === 1) queue.push(other);
  }
  for (const [key, vertex] of graph) if (vertex.next.size === 0) graph.delete(key);
  return open;
}

/** Removes what does not hang together with the block's top left corner, and returns a point of each such group. */
function dropIslands(graph: Graph): Vector[] {
  const islands: Vector[] = [];
  const kept = reach(graph, keyOf({ x: ZERO, y: ZERO }));
  for (const [key, vertex] of [...graph]) {
    if (kept.has(key) || !graph.has(key)) continue;
    islands.push(vertex.point);
    for (const lost of reach(graph, key)) graph.delete(lost);
  }
  return islands;
}

function reach(graph: Graph, start: string): Set<string> {
  const seen = new Set([start]);
  const queue = [start];
  while (queue.length) {
    for (const next of graph.get(queue.pop() ?? "")?.next ?? []) {
      if (!seen.has(next)) {
        seen.add(next);
        queue.push(next);
      }
    }
  }
  return seen;
}

function disconnect(graph: Graph, a: string, b: string): void {
  graph.get(a)?.next.delete(b);
  graph.get(b)?.next.delete(a);
}

/** Follows every directed edge, turning at each vertex to the next one anticlockwise, until it comes back. */
function walkAll(graph: Graph): Vector[][] {
  const around = new Map([...graph].map(([key, vertex]) => [key, clockwise(graph, vertex)]));
  const done = new Set<string>();
  const walks: Vector[][] = [];
  for (const [start, order] of around) {
    for (const first of order) {
      const walk: Vector[] = [];
      let [from, to] = [start, first];
      while (!done.has(`${from} ${to}`)) {
        done.add(`${from} ${to}`);
        const point = graph.get(from)?.point;
        if (point) walk.push(point);
        const turns = around.get(to) ?? [];
        // The edge just before the way back, clockwise, is the sharpest right turn: the face lies to the right.
        const next = turns[(turns.indexOf(from) + turns.length - 1) % turns.length] ?? from;
        [from, to] = [to, next];
      }
      if (walk.length) walks.push(walk);
    }
  }
  return walks;
}

/** The neighbours of a vertex in clockwise order on the screen, from due right. Exact: by half plane, then by turn. */
function clockwise(graph: Graph, vertex: Vertex): string[] {
  const directions = [...vertex.next].map((key) => ({ key, way: minus(graph.get(key)?.point ?? vertex.point, vertex.point) }));
  const half = ({ way }: { way: Vector }) => (sign(way.y) > 0 || (isZero(way.y) && sign(way.x) > 0) ? 0 : 1);
  return directions.sort((a, b) => half(a) - half(b) || -sign(cross(a.way, b.way)) || sign(dot(a.way, b.way))).map((each) => each.key);
}

/** Edges that one walk takes both ways: the same face lies on either side of them. */
function bridgesIn(walks: readonly (readonly Vector[])[]): [string, string][] {
  const bridges: [string, string][] = [];
  for (const walk of walks) {
    const keys = walk.map(keyOf);
    const taken = new Set<string>();
    for (const [index, from] of keys.entries()) {
      const to = keys[(index + 1) % keys.length] ?? from;
      if (taken.has(`${to} ${from}`)) bridges.push([from, to]);
      taken.add(`${from} ${to}`);
    }
  }
  return bridges;
}

/** Twice the area; above zero when the walk goes clockwise on the screen. */
export function doubleArea(walk: readonly Vector[]): Exact {
  return walk.reduce<Exact>((sum, point, index) => {
    const next = walk[(index + 1) % walk.length] ?? point;
    return add(sum, subtract(multiply(point.x, next.y), multiply(next.x, point.y)));
  }, ZERO);
}
