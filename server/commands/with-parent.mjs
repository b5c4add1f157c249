/**
 * Loaded into a process by the command that starts it: when that command dies, however it dies, its end of the
 * channel closes and the process ends too, instead of holding the port, or writing, for ever.
 */
process.on('disconnect', () => process.kill(process.pid, 'SIGTERM'));
// It died before this was loaded: nobody will say so any more.
if (process.channel !== undefined && !process.connected) process.exit(1);
process.channel?.unref();
