import { createTransport } from 'nodemailer';
import type { Config } from '../config/index';
import type { OutgoingMail } from '../services/context';

/** Sends one mail; throws when the SMTP server does not take it. */
export type SendMail = (mail: OutgoingMail) => Promise<void>;

export function createMailer(config: Config, smtpUrl: string): SendMail {
  const transport = createTransport(smtpUrl);
  return async ({ to, subject, text }) => {
    await transport.sendMail({ from: config.mailFrom, to, subject, text });
  };
}
