/** Starts what works behind the pages, once a server process: sending e-mail and making plans. */
export async function register(): Promise<void> {
  if (process.env.NEXT_RUNTIME !== "nodejs") return;
  const { startBackgroundWork } = await import("./lib/server/background-work");
  startBackgroundWork();
}
