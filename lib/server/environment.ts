import { z } from "zod";

const schema = z.object({
  DATABASE_URL: z.string().min(1, "DATABASE_URL says where PostgreSQL is"),
  DATABASE_DIRECT_URL: z.string().optional(),
  NEXTAUTH_URL: z.string().default("http://127.0.0.1:3000"),
  NEXTAUTH_SECRET: z.string().min(16, "NEXTAUTH_SECRET signs the session cookie: at least 16 characters"),
  SMTP_URL: z.string().default(""),
  MAIL_FROM: z.string().default("shop@ellwand.localhost"),
  /** The folder in which the local mail sink keeps what it received; empty when mail goes out for real. */
  MAIL_SINK_FOLDER: z.string().default(""),
  PLANNER_WORKER: z.string().default("build/planner-worker.mjs"),
  /** Set only when a proxy of one's own stands in front and overwrites X-Forwarded-For. */
  TRUSTED_PROXY: z.enum(["", "1"]).default(""),
});

export type Environment = z.infer<typeof schema>;

let read: Environment | null = null;

/** The process's settings, checked once. Throws with every fault named. */
export function environment(): Environment {
  if (read) return read;
  const parsed = schema.safeParse(process.env);
  if (!parsed.success) throw new Error(parsed.error.issues.map((issue) => `${issue.path.join(".")}: ${issue.message}`).join("; "));
  read = parsed.data;
  return read;
}
