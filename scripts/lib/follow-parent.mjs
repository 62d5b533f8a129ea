// Loaded before a child's own code. When the parent is gone, however it went, the child stops as if asked to.
const patience = 12_000;

if (process.channel) {
  process.once('disconnect', () => {
    // Code of its own that sees to this already must not be told twice.
    if (process.listenerCount('disconnect') === 0) process.kill(process.pid, 'SIGTERM');
    setTimeout(() => process.exit(1), patience).unref();
  });
  // Listening must not keep a child alive that has finished.
  process.channel.unref();
}
