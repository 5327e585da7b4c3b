/*
 * Loaded ahead of a server that `npm start` runs. When that parent is killed outright it can pass on no signal, but
 * the channel to it closes; without this the server would live on, holding the port.
 */
process.once('disconnect', () => process.kill(process.pid, 'SIGTERM'))
process.channel?.unref()
