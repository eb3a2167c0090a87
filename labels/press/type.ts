import type { Face } from "./faces";
import type { Press } from "./press";
import { printable } from "./printable";

export interface Style {
  readonly face: Face;
  /** Points. */
  readonly size: number;
  readonly colour?: string;
}

/** Text in one face, or stretches in several. */
export type Text = string | readonly { readonly text: string; readonly face: Face }[];

interface Run {
  readonly text: string;
  readonly face: Face;
  readonly fraction: boolean;
}

/** A whole number, a space and a fraction stay together and are set as one mixed number. */
const FRACTION = /(?:\d+[ \u00a0])?\d+\u2044\d+/g;
const FRACTION_FEATURES: PDFKit.Mixins.OpenTypeFeatures[] = ["kern", "liga", "frac"];
const ELLIPSIS = "\u2026";

/** Fractions of the line height between baselines. */
const LEADING = 1.28;

function runsOf(text: Text, face: Face): Run[] {
  const spans = typeof text === "string" ? [{ text, face }] : text;
  const runs: Run[] = [];
  for (const span of spans) {
    for (const part of printable(span.text, span.face)) {
      let from = 0;
      for (const match of part.text.matchAll(FRACTION)) {
        if (match.index > from) runs.push({ text: part.text.slice(from, match.index), face: part.face, fraction: false });
        runs.push({ text: match[0].replace("\u00a0", " "), face: figureFace(part.face), fraction: true });
        from = match.index + match[0].length;
      }
      if (from < part.text.length) runs.push({ text: part.text.slice(from), face: part.face, fraction: false });
    }
  }
  return runs;
}

function figureFace(face: Face): Face {
  if (face === "word" || face === "word-italic") return "mid";
  return face === "word-strong" ? "strong" : face;
}

/** Widths at one point, by document: the same words are measured again for every label and every size tried. */
const widths = new WeakMap<Press, Map<string, number>>();

function runWidth(press: Press, run: Run, size: number): number {
  let known = widths.get(press);
  if (!known) widths.set(press, (known = new Map()));
  const key = `${run.face}${run.fraction ? "/" : ":"}${run.text}`;
  let width = known.get(key);
  if (width === undefined) {
    const doc = press.doc.font(run.face).fontSize(1);
    width = run.fraction ? doc.widthOfString(run.text, { features: FRACTION_FEATURES }) : doc.widthOfString(run.text);
    known.set(key, width);
  }
  return width * size;
}

/** Width in points. */
export function textWidth(press: Press, text: Text, style: Style): number {
  return runsOf(text, style.face).reduce((total, run) => total + runWidth(press, run, style.size), 0);
}

export interface LineOptions {
  readonly align?: "left" | "right" | "centre";
  /** A line wider than this is cut with an ellipsis. */
  readonly width?: number;
}

/** One line; `x` is its left edge, right edge or middle as `align` says, `baseline` the foot of its letters. Returns its width. */
export function drawLine(press: Press, text: Text, style: Style, x: number, baseline: number, options: LineOptions = {}): number {
  const lines = options.width === undefined ? [runsOf(text, style.face)] : breakLines(press, text, style, options.width, 1);
  const runs = lines[0] ?? [];
  const widths = runs.map((run) => runWidth(press, run, style.size));
  const total = widths.reduce((sum, width) => sum + width, 0);
  const shift = options.align === "right" ? total : options.align === "centre" ? total / 2 : 0;
  drawRuns(press, runs, widths, style, x - shift, baseline);
  return total;
}

function drawRuns(press: Press, runs: readonly Run[], widths: readonly number[], style: Style, x: number, baseline: number): void {
  let at = x;
  runs.forEach((run, i) => {
    press.doc.font(run.face).fontSize(style.size).fillColor(style.colour ?? "#000000");
    const features = run.fraction ? { features: FRACTION_FEATURES } : {};
    press.doc.text(run.text, at, baseline, { lineBreak: false, baseline: "alphabetic", ...features });
    at += widths[i] ?? 0;
  });
}

export interface ParagraphOptions {
  readonly width: number;
  readonly maxLines?: number;
  /** Baseline to baseline, as a multiple of the size. */
  readonly leading?: number;
  readonly align?: "left" | "right" | "centre";
}

/** Wraps text into a column whose top is `top`; what does not fit `maxLines` ends in an ellipsis. Returns the bottom. */
export function drawParagraph(press: Press, text: Text, style: Style, x: number, top: number, options: ParagraphOptions): number {
  const step = style.size * (options.leading ?? LEADING);
  const lines = breakLines(press, text, style, options.width, options.maxLines ?? Infinity);
  lines.forEach((runs, i) => {
    const widths = runs.map((run) => runWidth(press, run, style.size));
    const total = widths.reduce((sum, width) => sum + width, 0);
    const room = options.width - total;
    const shift = options.align === "right" ? room : options.align === "centre" ? room / 2 : 0;
    drawRuns(press, runs, widths, style, x + shift, top + step * i + style.size * 0.98);
  });
  return top + step * lines.length;
}

/** Height that `drawParagraph` would take. */
export function paragraphHeight(press: Press, text: Text, style: Style, options: ParagraphOptions): number {
  const lines = breakLines(press, text, style, options.width, options.maxLines ?? Infinity);
  return lines.length * style.size * (options.leading ?? LEADING);
}

/** The largest size, from `style.size` down to `least`, at which the text stands on `maxLines` without being cut. */
export function fittingSize(press: Press, text: Text, style: Style, width: number, maxLines: number, least: number): number {
  for (let size = style.size; size > least; size -= 1) {
    const lines = breakLines(press, text, { ...style, size }, width, maxLines + 1, true);
    if (lines.length <= maxLines) return size;
  }
  return least;
}

interface Word {
  readonly runs: readonly Run[];
  readonly width: number;
  readonly spaceBefore: number;
}

/**
 * Greedy line breaking at spaces. A word wider than the column is broken between letters, unless `wholeWords` asks
 * for the extra line instead (used when a smaller size is still to be tried).
 */
function breakLines(press: Press, text: Text, style: Style, width: number, maxLines: number, wholeWords = false): Run[][] {
  const lines: Run[][] = [];
  let line: Run[] = [];
  let used = 0;
  const words = wordsOf(press, text, style).flatMap((word) => {
    if (word.width <= width) return [word];
    return wholeWords ? [word, word] : splitWord(press, word, style, width);
  });
  for (const [index, word] of words.entries()) {
    const forced = wholeWords && word.width > width;
    if (line.length && (used + word.spaceBefore + word.width > width + 0.01 || forced)) {
      if (lines.length + 1 >= maxLines) {
        const rest = words.slice(index).flatMap((each) => [...spaceRun(each, style), ...each.runs]);
        return [...lines, shorten(press, [...line, ...rest], style, width)];
      }
      lines.push(line);
      line = [];
      used = 0;
    }
    if (line.length && word.spaceBefore) {
      line.push(...spaceRun(word, style));
      used += word.spaceBefore;
    }
    line.push(...word.runs);
    used += word.width;
  }
  return line.length ? [...lines, merge(line)].map(merge) : lines.map(merge);
}

function spaceRun(word: Word, style: Style): Run[] {
  return word.spaceBefore ? [{ text: " ", face: word.runs[0]?.face ?? style.face, fraction: false }] : [];
}

function wordsOf(press: Press, text: Text, style: Style): Word[] {
  const words: Word[] = [];
  let current: Run[] = [];
  let spaced = false;
  const close = () => {
    if (!current.length) return;
    const face = current[0]?.face ?? style.face;
    const width = current.reduce((sum, run) => sum + runWidth(press, run, style.size), 0);
    const spaceBefore = spaced && words.length ? runWidth(press, { text: " ", face, fraction: false }, style.size) : 0;
    words.push({ runs: current, width, spaceBefore });
    current = [];
    spaced = false;
  };
  for (const run of runsOf(text, style.face)) {
    if (run.fraction) {
      current.push(run);
      continue;
    }
    for (const part of run.text.split(/( +)/)) {
      if (/^ +$/.test(part)) {
        close();
        spaced = true;
      } else if (part) current.push({ ...run, text: part });
    }
  }
  close();
  return words;
}

function splitWord(press: Press, word: Word, style: Style, width: number): Word[] {
  const out: Word[] = [];
  let runs: Run[] = [];
  let used = 0;
  let space = word.spaceBefore;
  for (const run of word.runs) {
    for (const letter of run.fraction ? [run.text] : [...run.text]) {
      const piece = { ...run, text: letter };
      const step = runWidth(press, piece, style.size);
      if (runs.length && used + step > width) {
        out.push({ runs: merge(runs), width: used, spaceBefore: space });
        runs = [];
        used = 0;
        space = 0;
      }
      runs.push(piece);
      used += step;
    }
  }
  if (runs.length) out.push({ runs: merge(runs), width: used, spaceBefore: space });
  return out;
}

function merge(runs: readonly Run[]): Run[] {
  const out: Run[] = [];
  for (const run of runs) {
    const last = out[out.length - 1];
    if (last && !last.fraction && !run.fraction && last.face === run.face) out[out.length - 1] = { ...last, text: last.text + run.text };
    else out.push(run);
  }
  return out;
}

function shorten(press: Press, runs: readonly Run[], style: Style, width: number): Run[] {
  const kept: Run[] = [];
  let used = 0;
  for (const run of merge(runs)) {
    const ellipsis = runWidth(press, { ...run, fraction: false, text: ELLIPSIS }, style.size);
    if (ellipsis > width) return [];
    for (const letter of run.fraction ? [run.text] : [...run.text]) {
      const step = runWidth(press, { ...run, text: letter }, style.size);
      if (used + step + ellipsis > width) {
        const face = kept[kept.length - 1]?.face ?? run.face;
        while (kept.length && /^[ ,;:.]$/.test(kept[kept.length - 1]?.text ?? "")) kept.pop();
        return merge([...kept, { text: ELLIPSIS, face, fraction: false }]);
      }
      kept.push({ ...run, text: letter });
      used += step;
    }
  }
  return merge(kept);
}
