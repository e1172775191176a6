/**
 * Only sends ticks: a hidden page's own timers are slowed to one a minute, a worker's are not. It never reads a clock,
 * since the page's clock is the one that counts.
 */
setInterval(() => self.postMessage(null), 250);

export {};
