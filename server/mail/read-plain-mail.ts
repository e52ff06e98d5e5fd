/** Subject and text of a message with one plain part, as our mailer writes them. */
export function readPlainMail(source: string): { subject: string; text: string } {
  const [head = '', ...rest] = source.replace(/\r\n/g, '\n').split('\n\n');
  const headers = readHeaders(head);
  return {
    subject: decodeWords(headers.get('subject') ?? ''),
    text: decodeBody(rest.join('\n\n'), headers.get('content-transfer-encoding') ?? '7bit'),
  };
}

function readHeaders(head: string): Map<string, string> {
  const headers = new Map<string, string>();
  for (const line of head.replace(/\n[ \t]+/g, ' ').split('\n')) {
    const colon = line.indexOf(':');
    if (colon > 0) headers.set(line.slice(0, colon).trim().toLowerCase(), line.slice(colon + 1).trim());
  }
  return headers;
}

// RFC 2047: encoded words, the space between two of them being no part of the text.
function decodeWords(text: string): string {
  return text
    .replace(/(\?=)\s+(=\?)/g, '$1$2')
    .replace(/=\?utf-8\?([bq])\?([^?]*)\?=/gi, (_word, kind: string, content: string) => {
      return kind.toLowerCase() === 'b'
        ? Buffer.from(content, 'base64').toString('utf8')
        : decodeQuoted(content.replaceAll('_', ' '));
    });
}

function decodeBody(body: string, encoding: string): string {
  switch (encoding.toLowerCase()) {
    case 'base64':
      return Buffer.from(body, 'base64').toString('utf8').replace(/\r\n/g, '\n');
    case 'quoted-printable':
      return decodeQuoted(body.replace(/=\n/g, ''));
    default:
      return body;
  }
}

function decodeQuoted(text: string): string {
  const bytes = text.replace(/=([0-9A-Fa-f]{2})/g, (_match, code: string) =>
    String.fromCharCode(parseInt(code, 16)),
  );
  return Buffer.from(bytes, 'latin1').toString('utf8');
}
