// Loaded before a child's own code: the child ends when whoever started it is gone, however that one ended.
process.once('disconnect', () => {
  setTimeout(() => process.exit(1), 12_000).unref();
  process.kill(process.pid, 'SIGTERM');
});
process.channel?.unref();
