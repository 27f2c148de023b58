/* Talks SMTP: one message at a time, with short time-outs, to the server that is configured or to the local catcher. */
import { createTransport } from 'nodemailer';

export type OutgoingMail = { messageId: string; to: string; subject: string; text: string };

export type Mailer = {
  /** Resolves when the server has taken the message; rejects with the reason otherwise. */
  send(mail: OutgoingMail): Promise<void>;
  close(): void;
};

const TIMEOUT = 10_000;

/** A mailer for `smtp://…` or `smtps://…`; on plain loopback no TLS is tried. */
export function makeMailer(url: string, from: string): Mailer {
  const { hostname, protocol } = new URL(url);
  const plain = protocol === 'smtp:' && ['127.0.0.1', 'localhost', '[::1]'].includes(hostname);
  const transport = createTransport({
    url,
    ignoreTLS: plain,
    connectionTimeout: TIMEOUT,
    greetingTimeout: TIMEOUT,
    socketTimeout: TIMEOUT,
    disableFileAccess: true,
    disableUrlAccess: true,
  });
  return {
    async send({ messageId, to, subject, text }) {
      await transport.sendMail({
        from,
        to,
        subject,
        text,
        messageId,
        headers: { 'Auto-Submitted': 'auto-generated' },
      });
    },
    close: () => {
      transport.close();
    },
  };
}
