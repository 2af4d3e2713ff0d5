import { createServer } from 'node:http';

const MOST = 200;

/**
 * Stands for the mail service on this machine: takes what its SDK posts, sends nothing, and shows what came.
 * An address that begins with "bounce" is refused, so that a failure can be seen.
 */
export function startMailFake(port = 0) {
  const messages = [];
  const byKey = new Map();
  const server = createServer((request, response) => {
    const reply = (status, body) => {
      response.writeHead(status, { 'content-type': 'application/json' });
      response.end(JSON.stringify(body));
    };
    if (request.method === 'GET' && request.url === '/outbox') return reply(200, { messages });
    if (request.method !== 'POST' || request.url !== '/emails')
      return reply(404, { name: 'not_found', message: 'There is nothing here.' });
    let text = '';
    request.on('data', (part) => (text += part));
    request.on('end', () => {
      const known = byKey.get(request.headers['idempotency-key']);
      if (known) return reply(200, { id: known });
      let mail;
      try {
        mail = JSON.parse(text);
      } catch {
        return reply(400, { name: 'validation_error', message: 'The message could not be read.' });
      }
      const to = [mail.to].flat();
      if (to.some((address) => String(address).startsWith('bounce')))
        return reply(422, { name: 'validation_error', message: 'The address does not take mail.' });
      const id = `local-${messages.length + 1}`;
      messages.unshift({
        id,
        to,
        from: mail.from,
        subject: mail.subject,
        text: mail.text ?? '',
        html: mail.html ?? '',
      });
      messages.length = Math.min(messages.length, MOST);
      const key = request.headers['idempotency-key'];
      if (key) byKey.set(key, id);
      reply(200, { id });
    });
  });
  return new Promise((resolve, reject) => {
    server.once('error', reject);
    server.listen(port, '127.0.0.1', () => {
      server.unref();
      resolve(`http://127.0.0.1:${server.address().port}`);
    });
  });
}
