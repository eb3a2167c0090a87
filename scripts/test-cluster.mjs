import pg from "pg";
import { ensurePostgres, TEST_CLUSTER } from "./postgres.mjs";

const TRIES = 4;

/**
 * The cluster of the tests, shared by every test run of this folder. Whoever leaves last stops it.
 * @returns {Promise<{ url: string, leave: () => Promise<void> }>} url: an administrative database in the cluster.
 */
export async function joinTestCluster() {
  for (let attempt = 1; ; attempt += 1) {
    const cluster = await ensurePostgres(TEST_CLUSTER);
    const presence = new pg.Client({ connectionString: cluster.url, application_name: "presence" });
    // The server ends this connection when someone stops the cluster by hand; that is no fault of the tests.
    presence.on("error", () => undefined);
    try {
      await presence.connect();
      return { url: cluster.url, leave: () => leave(presence, cluster.leave) };
    } catch (error) {
      // The last one of another run may just have stopped it.
      if (attempt === TRIES) throw error;
    }
  }
}

/** @param {pg.Client} presence @param {() => Promise<void>} stopUnlessUsed */
async function leave(presence, stopUnlessUsed) {
  await presence.end();
  await stopUnlessUsed();
}
