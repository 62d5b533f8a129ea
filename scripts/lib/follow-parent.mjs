// Loaded before a child's own code. When the parent is gone, however it went, the child stops as if asked to.
const patience = 8_000;

if (process.channel) {
  process.once('disconnect', () => {
    process.kill(process.pid, 'SIGTERM');
    setTimeout(() => process.exit(1), patience).unref();
  });
  // Listening must not keep a child alive that has finished.
  process.channel.unref();
}
