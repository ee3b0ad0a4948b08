import type { Server } from 'node:http';
import type { Socket } from 'node:net';
import { problemTypes, type ProblemType } from '../../shared/contract/problem.js';

/**
 * Answers requests that break off before any handler sees them (headers too large, no HTTP at all) with a problem
 * document instead of an empty line.
 */
export function answerClientErrors(server: Server): void {
  server.on('clientError', (error: Error & { code?: string }, stream) => {
    const socket = stream as Socket;
    if (error.code === 'ECONNRESET' || !socket.writable) {
      socket.destroy();
      return;
    }
    const [status, reason, detail, remedy] =
      error.code === 'HPE_HEADER_OVERFLOW'
        ? [
            431,
            'Request Header Fields Too Large',
            'The headers are larger than 16 KB.',
            'Send fewer or shorter headers; delete cookies that are not needed.',
          ]
        : [
            400,
            'Bad Request',
            'This is not a request that can be read.',
            'Send HTTP/1.1 as RFC 9112 has it.',
          ];
    const type: ProblemType = 'not-valid';
    const body = JSON.stringify({
      type: `/problems/${type}`,
      title: problemTypes[type],
      status,
      detail,
      remedy,
    });
    socket.end(
      `HTTP/1.1 ${status} ${reason}\r\nContent-Type: application/problem+json\r\nContent-Length: ${Buffer.byteLength(body)}\r\nConnection: close\r\n\r\n${body}`,
    );
  });
}
