import { createConnection, createServer } from 'node:net';

/** The port of a service is taken by somebody else; the message is meant for whoever starts the program. */
export class PortTaken extends Error {
  constructor(port, what, variable) {
    super(
      `Port ${port} for ${what} is in use by another program: stop that program, or set ${variable} to a free port.`,
    );
    this.name = 'PortTaken';
  }
}

/** Throws PortTaken where nothing can listen on `port` of 127.0.0.1. */
export async function demandFreePort(port, what, variable) {
  const taken = await new Promise((resolve, reject) => {
    const probe = createServer();
    probe.once('error', (error) => (error.code === 'EADDRINUSE' ? resolve(true) : reject(error)));
    probe.listen(port, '127.0.0.1', () => probe.close(() => resolve(false)));
  });
  if (taken) throw new PortTaken(port, what, variable);
}

/** A port of 127.0.0.1 that was free a moment ago. */
export async function freePort() {
  return new Promise((resolve, reject) => {
    const probe = createServer();
    probe.once('error', reject);
    probe.listen(0, '127.0.0.1', () => {
      const { port } = probe.address();
      probe.close(() => resolve(port));
    });
  });
}

/** Whether the server on `port` opens the talk within a second with bytes that `isGreeting` accepts. */
export async function greets(port, isGreeting) {
  return new Promise((resolve) => {
    const socket = createConnection({ port, host: '127.0.0.1', timeout: 1000 });
    const end = (answer) => {
      socket.destroy();
      resolve(answer);
    };
    socket.once('data', (bytes) => end(isGreeting(bytes)));
    socket.once('error', () => end(false));
    socket.once('timeout', () => end(false));
    socket.once('close', () => end(false));
  });
}
