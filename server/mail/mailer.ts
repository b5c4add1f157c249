import nodemailer from 'nodemailer';

export interface Mailer {
  send(mail: {
    readonly messageId: string;
    readonly to: string;
    readonly subject: string;
    readonly text: string;
  }): Promise<void>;
  close(): void;
}

/** Mail over SMTP. The id of a mail is its message id, so that one sent twice by mischance is shown once. */
export function openMailer(smtpUrl: string, from: string): Mailer {
  const url = new URL(smtpUrl);
  const isLoopback = url.hostname === '127.0.0.1';
  const transport = nodemailer.createTransport({
    host: url.hostname,
    port: Number(url.port) || (url.protocol === 'smtps:' ? 465 : 587),
    secure: url.protocol === 'smtps:',
    requireTLS: url.protocol === 'smtp:' && !isLoopback,
    ignoreTLS: isLoopback,
    connectionTimeout: 10_000,
    socketTimeout: 20_000,
    ...(url.username === ''
      ? {}
      : { auth: { user: decodeURIComponent(url.username), pass: decodeURIComponent(url.password) } }),
  });
  const domain = /@([^>\s]+)/.exec(from)?.[1] ?? 'localhost';
  return {
    async send({ messageId, to, subject, text }) {
      // The recipient as an object: an address from outside is never read as a list of several.
      await transport.sendMail({
        from,
        to: { name: '', address: to },
        subject,
        text,
        messageId: `<${messageId}@${domain}>`,
        headers: { 'Auto-Submitted': 'auto-generated' },
      });
    },
    close: () => transport.close(),
  };
}
