import { readdir, readFile } from "node:fs/promises";
import path from "node:path";
import { environment } from "@/lib/server/environment";
import { parseMessage, type ParsedMessage } from "@/lib/server/mail/parse-message";

export interface SunkMail extends ParsedMessage {
  readonly id: string;
  readonly receivedAt: Date;
}

/** A letter's file is named by the time it came, then by chance: `1764600000000-0a1b2c3d.eml`. */
const NAME = /^(\d{10,16})-[0-9a-f]{8}\.eml$/;
const LISTED = 200;

/** Whether letters are kept here to be read, and none goes out. */
export function mailIsSunk(): boolean {
  return environment().MAIL_SINK_FOLDER !== "";
}

/** The latest 200 letters, newest first; none when mail goes out for real. */
export async function listSunkMail(): Promise<SunkMail[]> {
  const folder = environment().MAIL_SINK_FOLDER;
  if (!folder) return [];
  const names = (await readdir(folder).catch(() => [])).filter((name) => NAME.test(name)).sort().reverse().slice(0, LISTED);
  const letters = await Promise.all(names.map((name) => readLetter(folder, name)));
  return letters.filter((each) => each !== null);
}

/** One letter by its id; null when there is none. */
export async function readSunkMail(id: string): Promise<SunkMail | null> {
  const folder = environment().MAIL_SINK_FOLDER;
  // The id becomes a file name, so nothing but the shape of our own names is looked for.
  return folder && NAME.test(`${id}.eml`) ? readLetter(folder, `${id}.eml`) : null;
}

async function readLetter(folder: string, name: string): Promise<SunkMail | null> {
  try {
    const source = await readFile(path.join(folder, name), "latin1");
    return { id: name.slice(0, -".eml".length), receivedAt: new Date(Number(NAME.exec(name)?.[1])), ...parseMessage(source) };
  } catch {
    return null;
  }
}
