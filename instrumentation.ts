/** What the server does beside answering. Next calls `register` once when a server starts. */
export async function register(): Promise<void> {
  // Spelt this way so that Next leaves the import out of what it builds for other runtimes.
  if (process.env.NEXT_RUNTIME === "nodejs") {
    if (process.env.NEXT_PHASE === "phase-production-build") return;
    const { startDelivery } = await import("@/lib/mail/deliver");
    startDelivery();
  }
}
