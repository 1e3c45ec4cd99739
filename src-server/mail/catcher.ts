import { Router, type RequestHandler } from 'express';
import { SMTPServer } from 'smtp-server';

export interface CaughtMail {
  at: string;
  to: string[];
  subject: string;
  text: string;
}

export interface MailCatcher {
  /** `smtp://127.0.0.1:port` */
  url: string;
  mails: readonly CaughtMail[];
  close(): Promise<void>;
}

const mostKept = 500;

/** Text in quoted-printable (RFC 2045 §6.7); in a header `_` stands for a space (RFC 2047 §4.2). */
function quotedPrintable(text: string): string {
  const bytes = text
    .replace(/=\r\n/g, '')
    .replace(/=([0-9A-F]{2})/gi, (_, code: string) => String.fromCharCode(parseInt(code, 16)));
  return Buffer.from(bytes, 'latin1').toString('utf8');
}

const base64 = (text: string): string => Buffer.from(text, 'base64').toString('utf8');

/** A header with words in `=?UTF-8?Q?…?=` or `=?UTF-8?B?…?=` (RFC 2047). */
function headerText(text: string): string {
  return text
    .replace(/\?=\s+=\?/g, '?==?')
    .replace(/=\?utf-8\?([qb])\?([^?]*)\?=/gi, (_, encoding: string, word: string) =>
      encoding.toLowerCase() === 'b' ? base64(word) : quotedPrintable(word.replaceAll('_', ' ')),
    );
}

/** Reads a mail of one text part, as the product sends them. */
export function readMail(raw: string, to: string[]): CaughtMail {
  const [head = '', ...rest] = raw.split('\r\n\r\n');
  const headers = head.replace(/\r\n[ \t]+/g, ' ');
  const subject = /^Subject: (.*)$/im.exec(headers)?.[1] ?? '';
  const encoding = /^Content-Transfer-Encoding: *(\S+)/im.exec(headers)?.[1]?.toLowerCase();
  const body = rest.join('\r\n\r\n');
  const text = encoding === 'quoted-printable' ? quotedPrintable(body) : encoding === 'base64' ? base64(body) : body;
  return {
    at: new Date().toISOString(),
    to,
    subject: headerText(subject),
    text: text.replace(/\r\n/g, '\n').trim(),
  };
}

/** Only whoever sits at the machine itself reads other people's mails. */
const onLoopback: RequestHandler = (request, _response, next) =>
  next(/^(?:127\.|::1$|::ffff:127\.)/.test(request.ip ?? '') ? undefined : 'router');

/** An SMTP server on loopback that keeps what it gets instead of delivering it: for development, the demo and tests. */
export async function startMailCatcher(): Promise<MailCatcher> {
  const mails: CaughtMail[] = [];
  const server = new SMTPServer({
    disabledCommands: ['AUTH', 'STARTTLS'],
    size: 1_000_000,
    onData(stream, session, callback) {
      const chunks: Buffer[] = [];
      stream.on('data', (chunk: Buffer) => chunks.push(chunk));
      stream.on('end', () => {
        mails.push(
          readMail(
            Buffer.concat(chunks).toString('utf8'),
            session.envelope.rcptTo.map((recipient) => recipient.address),
          ),
        );
        if (mails.length > mostKept) mails.shift();
        callback();
      });
    },
  });
  await new Promise<void>((resolve, reject) => {
    server.once('error', reject);
    server.listen(0, '127.0.0.1', resolve);
  });
  const address = server.server.address();
  const port = typeof address === 'object' && address !== null ? address.port : 0;
  return {
    url: `smtp://127.0.0.1:${port}`,
    mails,
    close: () => new Promise((resolve) => server.close(() => resolve())),
  };
}

/** Page of the caught mails, newest first, as plain text. */
export function catcherRoutes(catcher: MailCatcher): Router {
  const router = Router();
  router.get('/dev/mails', onLoopback, (request, response) => {
    const newest = [...catcher.mails].reverse();
    if (request.accepts(['text', 'json']) === 'json') response.json(newest);
    else
      response
        .type('text')
        .send(
          newest
            .map((mail) => `${mail.at}\nTo: ${mail.to.join(', ')}\nSubject: ${mail.subject}\n\n${mail.text}\n`)
            .join(`\n${'-'.repeat(60)}\n\n`) || 'No mail yet.',
        );
  });
  return router;
}
