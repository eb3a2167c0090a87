import { db } from "@/models/database";

export async function isDatabaseUp(): Promise<boolean> {
  try {
    await db().sequelize.query("SELECT 1");
    return true;
  } catch {
    return false;
  }
}
