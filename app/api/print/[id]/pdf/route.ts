import { z } from "zod";
import { fail } from "@/lib/core/result";
import { isPrintDocument, printDocumentPdf } from "@/labels/documents";
import { getPrintDocument } from "@/lib/data/print/queue";
import { route } from "@/lib/server/doors/route";

const input = z.object({ id: z.coerce.number().int().positive() });

/** A print job's document as a PDF. */
export const GET = route(input, "print.see", async (_actor, { id }) => {
  const job = await getPrintDocument(id);
  if (!job || !isPrintDocument(job.document)) return fail("unknown-job", `There is no print job ${id}; it may have been cleared away.`);
  const pdf = await printDocumentPdf(job.document);
  return new Response(new Uint8Array(pdf), { headers: { "content-type": "application/pdf", "content-disposition": "inline", "cache-control": "private, no-store" } });
});
