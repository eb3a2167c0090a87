import { CORE_VERSION } from "../lib/core/core-version";
import { TRADITIONAL_BLOCKS } from "../lib/core/patchwork/traditional-blocks";
import { db } from "../models/database";

/** The library of traditional blocks, each as version 1 of a block that nobody owns. */
export async function seedBlocks(): Promise<void> {
  for (const { slug, name, drawing, size, roles } of TRADITIONAL_BLOCKS) {
    const [block] = await db().Block.findOrCreate({ where: { slug }, defaults: { slug, name, traditional: true } });
    await db().BlockVersion.findOrCreate({
      where: { blockId: block.id, version: 1 },
      defaults: { blockId: block.id, version: 1, name, drawing, width: size.width, height: size.height, roles, coreVersion: CORE_VERSION },
    });
  }
}
