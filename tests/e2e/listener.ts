import { createHash } from 'node:crypto';
import { createServer } from 'node:http';

/** A stranger on another port of this machine, who lets anybody in and keeps a list of what reached him. */
export async function startListener() {
  const received: string[] = [];
  const server = createServer((request, response) => {
    received.push(request.url ?? '');
    const events = request.url === '/events';
    response.writeHead(200, {
      'Access-Control-Allow-Origin': '*',
      'Content-Type': events ? 'text/event-stream' : 'text/javascript',
    });
    response.end(events ? 'data: x\n\n' : '');
  });
  server.on('upgrade', (request, socket) => {
    received.push(request.url ?? '');
    // The answer to a web socket's key, RFC 6455 section 1.3.
    const accept = createHash('sha1')
      .update(`${request.headers['sec-websocket-key']}258EAFA5-E914-47DA-95CA-C5AB0DC85B11`)
      .digest('base64');
    socket.end(
      `HTTP/1.1 101 Switching Protocols\r\nUpgrade: websocket\r\nConnection: Upgrade\r\nSec-WebSocket-Accept: ${accept}\r\n\r\n`,
    );
  });
  await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve));
  const address = server.address();
  if (address === null || typeof address === 'string') throw new Error('The listener has no port.');
  return {
    http: `http://127.0.0.1:${address.port}`,
    socket: `ws://127.0.0.1:${address.port}/socket`,
    received,
    async close() {
      server.closeAllConnections();
      await new Promise((resolve) => server.close(resolve));
    },
  };
}
