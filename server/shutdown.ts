import type { Server } from "node:http";

/**
 * Stops taking requests, lets those under way finish, and closes connections as they fall idle, since a client
 * that keeps its connection alive would hold the program for seconds. Past the limit the rest is cut off.
 */
export async function closeGracefully(server: Server, { limitMs = 10_000 } = {}): Promise<void> {
  const closed = new Promise((resolve) => server.close(resolve));
  const idle = setInterval(() => server.closeIdleConnections(), 50);
  const limit = setTimeout(() => server.closeAllConnections(), limitMs);
  await closed;
  clearInterval(idle);
  clearTimeout(limit);
}
