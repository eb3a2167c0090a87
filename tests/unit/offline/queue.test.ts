import "fake-indexeddb/auto";
import { describe, expect, it } from "vitest";
import type { Answer, Entry } from "@/lib/offline/entry";
import { openQueue, type OutgoingQueue } from "@/lib/offline/queue";
import { sendEntry } from "@/lib/offline/send";
import { openStore } from "@/lib/offline/store";

let name = 0;

async function station(send: (entry: Entry) => Promise<Answer>, { personId = 1, database = `test-${(name += 1)}` } = {}) {
  const store = await openStore(database);
  return { database, store, queue: await openQueue({ store, personId, send }) };
}

const cut = (lane: string, said: string, personId = 1) => ({ lane, path: "/api/cuts", body: { said }, said, personId });

async function settled(queue: OutgoingQueue) {
  await queue.drain();
  await queue.drain();
}

describe("the outgoing queue", () => {
  it("keeps what was done without a network and sends it in order, once, when the network is back", async () => {
    let network = false;
    const arrived: string[] = [];
    const { queue } = await station(async (entry) => {
      if (!network) return { kind: "later", reason: "no-network" };
      arrived.push(entry.said);
      return { kind: "taken", value: null };
    });
    for (const said of ["first", "second", "third"]) await queue.keep(cut("B1", said));
    await settled(queue);
    expect(queue.state().entries).toHaveLength(3);
    expect(queue.state().connection).toBe("no-network");
    network = true;
    await settled(queue);
    expect(arrived).toEqual(["first", "second", "third"]);
    expect(queue.state()).toEqual({ entries: [], connection: "connected" });
  });

  it("outlives the page: a queue opened anew on the same device sends what the old one kept", async () => {
    const { queue, database } = await station(async () => ({ kind: "later", reason: "no-network" }));
    await queue.keep(cut("B1", "kept"));
    await settled(queue);
    const arrived: string[] = [];
    const later = await station(
      async (entry) => {
        arrived.push(entry.said);
        return { kind: "taken", value: null };
      },
      { database },
    );
    await settled(later.queue);
    expect(arrived).toEqual(["kept"]);
  });

  it("sets a refused entry aside with its sentence and goes on with the lane", async () => {
    const { queue } = await station(async (entry) => (entry.said === "bad" ? { kind: "refused", sentence: "The bolt is another one." } : { kind: "taken", value: null }));
    await queue.keep(cut("B1", "bad"));
    await queue.keep(cut("B1", "good"));
    await settled(queue);
    const [left, ...others] = queue.state().entries;
    expect(others).toEqual([]);
    expect(left).toMatchObject({ said: "bad", state: "refused", refusal: "The bolt is another one." });
    await queue.dismiss(left?.id ?? "");
    expect(queue.state().entries).toEqual([]);
  });

  it("does not hold up one bolt because another cannot be sent", async () => {
    const arrived: string[] = [];
    const { queue } = await station(async (entry) => {
      if (entry.lane === "B1") return { kind: "later", reason: "server-down" };
      arrived.push(entry.said);
      return { kind: "taken", value: null };
    });
    await queue.keep(cut("B1", "waits"));
    await queue.keep(cut("B2", "goes"));
    await settled(queue);
    expect(arrived).toEqual(["goes"]);
  });

  it("leaves another person's entries alone", async () => {
    const { queue, database } = await station(async () => ({ kind: "later", reason: "signed-out" }));
    await queue.keep(cut("B1", "Tobias cut this"));
    await settled(queue);
    const sent: string[] = [];
    const other = await station(
      async (entry) => {
        sent.push(entry.said);
        return { kind: "taken", value: null };
      },
      { database, personId: 2 },
    );
    await settled(other.queue);
    expect(sent).toEqual([]);
    expect(other.queue.state().entries).toHaveLength(1);
  });
});

describe("sending an entry", () => {
  const entry: Entry = { id: "1", lane: "B1", path: "/api/cuts", body: {}, said: "", personId: 1, madeAt: 0, state: "waiting", refusal: null };
  const answering = (body: string, status: number) => sendEntry(entry, async () => new Response(body, { status }));

  it("is taken by a 2xx alone", async () => {
    expect(await answering('{"left":1}', 200)).toEqual({ kind: "taken", value: { left: 1 } });
  });

  it("is refused only by the shop's own sentence", async () => {
    expect(await answering('{"fault":{"code":"wrong-bolt","message":"Wrong bolt."}}', 409)).toEqual({ kind: "refused", sentence: "Wrong bolt." });
    expect(await answering("<html>Hotel sign-in</html>", 403)).toMatchObject({ kind: "later" });
  });

  it("waits for a session, a server and a network", async () => {
    expect(await answering("{}", 401)).toEqual({ kind: "later", reason: "signed-out" });
    expect(await answering("{}", 502)).toEqual({ kind: "later", reason: "server-down" });
    expect(
      await sendEntry(entry, async () => {
        throw new TypeError("network");
      }),
    ).toEqual({ kind: "later", reason: "no-network" });
  });
});
