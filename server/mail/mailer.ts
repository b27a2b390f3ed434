import { createTransport } from 'nodemailer';

export interface Letter {
  readonly to: string;
  readonly subject: string;
  readonly text: string;
  readonly attachments?: readonly { readonly filename: string; readonly content: Buffer; readonly contentType: string }[];
}

export interface Mailer {
  /** Hands a letter to the mail server. @throws when that does not take it */
  send(letter: Letter): Promise<void>;
  close(): void;
}

/** @param settings.url `smtp://` or `smtps://`, with name and password where the server asks for them */
export function createMailer(settings: { readonly url: URL; readonly from: string }): Mailer {
  const transport = createTransport(settings.url.href, { from: settings.from, disableFileAccess: true, disableUrlAccess: true });
  return {
    async send({ to, subject, text, attachments = [] }) {
      await transport.sendMail({ to, subject, text, attachments: attachments.map((each) => ({ ...each })) });
    },
    close: () => transport.close(),
  };
}
