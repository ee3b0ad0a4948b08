import { createServer, type IncomingMessage, type Server, type ServerResponse } from 'node:http';
import type { Mailbox } from './mailbox.js';
import { listPage, mailPage } from './pages.js';
import { returnedMessage } from './returned.js';

const headers = {
  // A mail's HTML is shown as it came: nothing in it may load or run.
  'Content-Security-Policy':
    "default-src 'none'; style-src 'unsafe-inline'; img-src data:; frame-src 'self'; base-uri 'none'",
  'X-Content-Type-Options': 'nosniff',
  'Cache-Control': 'no-store',
};

/**
 * Pages to read the mail by, and for tests `GET /messages.json?to=<address>` (newest first), `DELETE /messages`,
 * `PUT` and `DELETE /refused/<address>` (whether mail to it is refused) and `GET /messages/<id>/returned?status=5.1.1`
 * (the report with which a mail is given back).
 */
export function createMailboxServer(mailbox: Mailbox): Server {
  return createServer((request, response) => answer(mailbox, request, response));
}

function answer(mailbox: Mailbox, request: IncomingMessage, response: ServerResponse): void {
  const address = new URL(request.url ?? '/', 'http://mailbox');
  if (request.method === 'DELETE' && address.pathname === '/messages') {
    mailbox.empty();
    response.writeHead(204, headers).end();
    return;
  }
  const refused = /^\/refused\/([^/]{1,300})$/.exec(address.pathname)?.[1];
  if (refused !== undefined && (request.method === 'PUT' || request.method === 'DELETE')) {
    mailbox.setRefused(decodeURIComponent(refused), request.method === 'PUT');
    response.writeHead(204, headers).end();
    return;
  }
  if (request.method !== 'GET') {
    send(response, 405, 'text/plain', 'Only GET, DELETE /messages, and PUT or DELETE /refused/<address>.');
    return;
  }
  if (address.pathname === '/messages.json') {
    send(
      response,
      200,
      'application/json',
      JSON.stringify(mailbox.list(address.searchParams.get('to') ?? undefined)),
    );
    return;
  }
  if (address.pathname === '/') {
    send(response, 200, 'text/html', listPage(mailbox.list()));
    return;
  }
  const [, id, returned] = /^\/messages\/(\d{1,9})(\/returned)?$/.exec(address.pathname) ?? [];
  const mail = mailbox.find(Number(id));
  if (mail && returned)
    send(
      response,
      200,
      'message/rfc822',
      returnedMessage(mail, address.searchParams.get('status') ?? '5.1.1'),
    );
  else if (mail) send(response, 200, 'text/html', mailPage(mail));
  else send(response, 404, 'text/plain', 'There is no such mail.');
}

function send(response: ServerResponse, status: number, type: string, body: string): void {
  response.writeHead(status, { ...headers, 'Content-Type': `${type}; charset=utf-8` }).end(body);
}
