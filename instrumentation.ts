/** Runs once in the server's process before it answers anything; not while the application is built. */
export async function register(): Promise<void> {
  if (process.env.NEXT_RUNTIME !== "nodejs" || process.env.NEXT_PHASE === "phase-production-build") return;
  const { boot } = await import("@/lib/commands/boot/boot");
  await boot();
}
