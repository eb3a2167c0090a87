import { z } from "zod";
import { route } from "@/lib/server/doors/route";
import { listen } from "@/lib/server/events/hub";

export const dynamic = "force-dynamic";

const HEARTBEAT_MS = 20_000;

/** Server-sent hints: a topic and its revision. The client fetches what it shows, and polls as well. */
export const GET = route(z.object({ topics: z.string().max(400).default("") }), "today.see", async (_actor, { topics }, request) => {
  const wanted = new Set(topics.split(",").filter(Boolean));
  const encoder = new TextEncoder();
  const stream = new ReadableStream({
    start(controller) {
      const write = (text: string) => {
        try {
          controller.enqueue(encoder.encode(text));
        } catch {
          stop();
        }
      };
      const unlisten = listen((hint) => {
        if (wanted.size === 0 || wanted.has(hint.topic)) write(`data: ${JSON.stringify(hint)}\n\n`);
      });
      const heartbeat = setInterval(() => write(": still here\n\n"), HEARTBEAT_MS);
      const stop = () => {
        clearInterval(heartbeat);
        unlisten();
      };
      request.signal.addEventListener("abort", () => {
        stop();
        controller.close();
      });
      write("retry: 3000\n\n");
    },
  });
  return new Response(stream, { headers: { "content-type": "text/event-stream", "cache-control": "no-store", "x-accel-buffering": "no" } });
});
