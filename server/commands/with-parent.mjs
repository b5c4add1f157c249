/**
 * Loaded into a process by the command that starts it: when that command dies, however it dies, its end of the
 * channel closes and the process ends too, instead of holding the port, or writing, for ever.
 */
process.on('disconnect', () => process.kill(process.pid, 'SIGTERM'));
process.channel?.unref();
