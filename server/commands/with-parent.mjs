/**
 * Loaded into the server by the command that starts it: when that command dies, however it dies, its end of the
 * channel closes and the server stops too, instead of holding the port for ever.
 */
process.on('disconnect', () => process.kill(process.pid, 'SIGTERM'));
process.channel?.unref();
