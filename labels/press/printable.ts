import { faceHas, understudyOf, type Face } from "./faces";

/** A stretch of text that one face can draw. */
export interface Printable {
  readonly text: string;
  readonly face: Face;
}

/** Signs people type or paste that have a plain way of being written. */
const WRITTEN: Readonly<Record<string, string>> = {
  "\u2033": "in",
  "\u2032": "ft",
  "\u2212": "-",
  "\u2010": "-",
  "\u2011": "-",
  "\u2192": "->",
  "\u2190": "<-",
  "\u2713": "x",
  "\u2605": "*",
  "\u2606": "*",
  "\u2665": "*",
  "\u3001": ",",
  "\u3002": ".",
  "\u2215": "\u2044",
};

const graphemes = new Intl.Segmenter("en", { granularity: "grapheme" });

/**
 * Splits text into stretches that can be drawn. A character the face lacks is set in its understudy, else written
 * plainly (without its accent, or in other letters), else printed as a question mark: never as an empty box, and
 * never silently left out. Control characters and line ends become spaces.
 */
export function printable(text: string, face: Face): Printable[] {
  const out: { text: string; face: Face }[] = [];
  const add = (part: string, partFace: Face) => {
    const last = out[out.length - 1];
    if (last && last.face === partFace) last.text += part;
    else if (part) out.push({ text: part, face: partFace });
  };
  const clean = text.normalize("NFC").replace(/[\u0000-\u001f\u007f-\u009f\u2028\u2029]+/g, " ");
  if (draws(face, clean)) return clean ? [{ text: clean, face }] : [];
  for (const { segment } of graphemes.segment(clean)) {
    const drawn = drawable(segment, face);
    add(drawn.text, drawn.face);
  }
  return out;
}

function drawable(grapheme: string, face: Face): Printable {
  if (draws(face, grapheme)) return { text: grapheme, face };
  const understudy = understudyOf(face);
  if (understudy && draws(understudy, grapheme)) return { text: grapheme, face: understudy };
  // Joiners and selectors are invisible by nature; only what can be seen needs a stand-in.
  const seen = grapheme.replace(/[\u200b-\u200f\u2060\ufe00-\ufe0f\ufeff\u00ad]/g, "");
  if (!seen) return { text: "", face };
  const plain = [...seen].map((character) => WRITTEN[character] ?? character).join("").normalize("NFKD").replace(/\p{M}/gu, "");
  if (plain && draws(face, plain)) return { text: plain, face };
  if (plain && understudy && draws(understudy, plain)) return { text: plain, face: understudy };
  return { text: "?", face };
}

function draws(face: Face, text: string): boolean {
  for (const character of text) if (!faceHas(face, character.codePointAt(0) ?? 0)) return false;
  return true;
}
