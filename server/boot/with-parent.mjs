/** Loaded before a program of ours (`node --import`): lets it end when the starter is gone, however that went. */
if (process.connected) {
  process.on('disconnect', () => process.kill(process.pid, 'SIGTERM'));
  process.channel?.unref();
}
