/** Loaded before a service: when the program that started it is gone, even by SIGKILL, the service ends as if told to. */
process.on('disconnect', () => process.kill(process.pid, 'SIGTERM'));
// The channel must not keep a service alive that has nothing left to do.
process.channel?.unref();
