import type { Actor } from "../lib/core/policy/policy";
import { closeDb, db, makeDb, useDb as workOn } from "../models/database";
import { seedBlocks } from "./seed-blocks";
import { seedKits } from "./seed-kits";
import { seedShop } from "./seed-shop";
import { seedStock } from "./seed-stock";

/**
 * Fills the database at `url` with the demo's shop through the shop's own use cases. Safe to run twice: what is there is
 * left as it is, and every request is answered once.
 */
export async function seedDemo(url: string): Promise<void> {
  workOn(makeDb(url, { pool: 4 }));
  try {
    await seedShop();
    const owner = await actorOf("owner");
    await seedStock(owner);
    await seedBlocks();
    await seedKits(owner);
  } finally {
    await closeDb();
  }
}

async function actorOf(role: Actor["roles"][number]): Promise<Actor> {
  const people = await db().Person.findAll({ order: [["id", "ASC"]] });
  const person = people.find((each) => each.roles.includes(role));
  if (!person) throw new Error(`The demo shop has no ${role}.`);
  return { personId: person.id, sessionId: "", name: person.name, roles: [role], place: person.place };
}
