/**
 * Preloaded into long-running children: when the launcher vanishes (kill -9 leaves it no time to
 * stop anything), the channel to it closes and the child's whole group ends.
 */
process.on('disconnect', () => process.kill(-process.pid, 'SIGTERM'));
process.channel?.unref();
// A child of ours that starts Node itself must not take the channel for its own.
delete process.env.NODE_CHANNEL_FD;
