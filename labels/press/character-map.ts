/**
 * Which characters a TrueType font can draw, from its `cmap` table (OpenType specification, formats 4 and 12).
 * A character that is mapped to glyph 0 counts as missing: it would print as an empty box.
 */
export function readCharacterMap(font: Buffer): ReadonlySet<number> {
  const table = findTable(font, "cmap");
  const characters = new Set<number>();
  const count = font.readUInt16BE(table + 2);
  for (let i = 0; i < count; i += 1) {
    const subtable = table + font.readUInt32BE(table + 4 + i * 8 + 4);
    const format = font.readUInt16BE(subtable);
    if (format === 4) readSegments(font, subtable, characters);
    if (format === 12) readGroups(font, subtable, characters);
  }
  return characters;
}

function findTable(font: Buffer, tag: string): number {
  const count = font.readUInt16BE(4);
  for (let i = 0; i < count; i += 1) {
    const record = 12 + i * 16;
    if (font.toString("latin1", record, record + 4) === tag) return font.readUInt32BE(record + 8);
  }
  throw new Error(`The font has no ${tag} table`);
}

function readSegments(font: Buffer, at: number, into: Set<number>): void {
  const doubled = font.readUInt16BE(at + 6);
  const ends = at + 14;
  const starts = ends + doubled + 2;
  const deltas = starts + doubled;
  const offsets = deltas + doubled;
  for (let i = 0; i < doubled; i += 2) {
    const delta = font.readUInt16BE(deltas + i);
    const offset = font.readUInt16BE(offsets + i);
    const start = font.readUInt16BE(starts + i);
    for (let code = start; code <= font.readUInt16BE(ends + i); code += 1) {
      if (code === 0xffff) continue;
      const glyph = offset === 0 ? code + delta : indirect(font, offsets + i + offset + (code - start) * 2, delta);
      if ((glyph & 0xffff) !== 0) into.add(code);
    }
  }
}

function indirect(font: Buffer, at: number, delta: number): number {
  const glyph = font.readUInt16BE(at);
  return glyph === 0 ? 0 : glyph + delta;
}

function readGroups(font: Buffer, at: number, into: Set<number>): void {
  const count = font.readUInt32BE(at + 12);
  for (let i = 0; i < count; i += 1) {
    const group = at + 16 + i * 12;
    const start = font.readUInt32BE(group);
    const glyph = font.readUInt32BE(group + 8);
    for (let code = start; code <= font.readUInt32BE(group + 4); code += 1) if (glyph + code - start !== 0) into.add(code);
  }
}
