// Loaded into the application ahead of it: when the start script is killed outright, the application stops by itself
// instead of holding port and database. The channel to the script breaks in that moment.
if (process.channel) {
  process.once('disconnect', () => process.kill(process.pid, 'SIGTERM'));
  process.channel.unref();
}
