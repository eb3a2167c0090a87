import { readFileSync } from "node:fs";
import path from "node:path";
import { readCharacterMap } from "./character-map";

/**
 * The faces a printed page is set in. Besley names things; Commissioner does all else, and every fraction, since
 * Besley has none.
 */
export type Face = "word" | "word-strong" | "word-italic" | "text" | "mid" | "strong" | "bold";

interface FaceFile {
  readonly file: string;
  /** Where a character goes that this face lacks; null when there is nothing wider to turn to. */
  readonly understudy: Face | null;
}

const FACES: Readonly<Record<Face, FaceFile>> = {
  word: { file: "besley-500.ttf", understudy: "mid" },
  "word-strong": { file: "besley-600.ttf", understudy: "strong" },
  "word-italic": { file: "besley-500-italic.ttf", understudy: "mid" },
  text: { file: "commissioner-400.ttf", understudy: null },
  mid: { file: "commissioner-500.ttf", understudy: null },
  strong: { file: "commissioner-600.ttf", understudy: null },
  bold: { file: "commissioner-700.ttf", understudy: null },
};

export const ALL_FACES = Object.keys(FACES) as Face[];

interface LoadedFace {
  readonly bytes: Buffer;
  readonly characters: ReadonlySet<number>;
}

/** Read once a process; each document still parses the outlines it uses. */
const loaded = new Map<Face, LoadedFace>();

function load(face: Face): LoadedFace {
  const known = loaded.get(face);
  if (known) return known;
  const bytes = readFileSync(path.join(process.cwd(), "fonts", "print", FACES[face].file));
  const fresh = { bytes, characters: readCharacterMap(bytes) };
  loaded.set(face, fresh);
  return fresh;
}

export function faceBytes(face: Face): Buffer {
  return load(face).bytes;
}

export function faceHas(face: Face, codePoint: number): boolean {
  return load(face).characters.has(codePoint);
}

export function understudyOf(face: Face): Face | null {
  return FACES[face].understudy;
}
