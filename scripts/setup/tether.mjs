// Loaded into every program that a command starts: when the command is gone, however it ended, so is the program.
if (process.connected) {
  process.once('disconnect', () => {
    process.kill(process.pid, 'SIGTERM');
    setTimeout(() => process.exit(1), 5000).unref();
  });
}
