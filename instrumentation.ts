/** Runs once in the server's process, before it answers anything. */
export async function register(): Promise<void> {
  if (process.env['NEXT_RUNTIME'] !== 'nodejs') return;
  const { markSocketAddresses } = await import('@/lib/http/address');
  markSocketAddresses();
  const { closeDatabase } = await import('@/lib/database');
  for (const signal of ['SIGTERM', 'SIGINT'] as const) process.once(signal, () => void closeDatabase());
}
