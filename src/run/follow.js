// Loaded into the server's process: when the one that started it is gone, the server goes too.
process.on('disconnect', () => process.kill(process.pid, 'SIGTERM'));
process.channel?.unref();
