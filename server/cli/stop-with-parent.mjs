// Loaded into the service with --import. When the process that started it is gone, also by kill -9, their channel
// breaks: the service then stops in order and gives its port free, as after a TERM.
if (process.channel !== undefined && process.channel !== null) {
  process.on('disconnect', () => process.kill(process.pid, 'SIGTERM'));
  // Listening for the break must not keep a service alive that has ended its work.
  process.channel.unref();
}
