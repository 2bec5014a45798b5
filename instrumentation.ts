/** Next runs this once when the server starts, before the first request. */
export async function register(): Promise<void> {
  // The bundler replaces this variable; without it the edge's copy would want a database driver.
  if (process.env.NEXT_RUNTIME !== 'nodejs') return;
  await import('@/lib/figures/register');
  const { sweepUploads } = await import('@/lib/reports/commands/sweep-uploads');
  await sweepUploads();
  const { startOutbox } = await import('@/lib/platform/mail/send-outbox');
  startOutbox();
}
