import { createTransport, type Transporter } from "nodemailer";
import { sendNextMail } from "@/lib/data/mail/outbox";
import { environment } from "@/lib/server/environment";

let transport: Transporter | null = null;

/** Sends every letter that is due. Without an SMTP address nothing is sent and the letters wait. */
export async function sendOutbox(): Promise<number> {
  const { SMTP_URL, MAIL_FROM } = environment();
  if (!SMTP_URL) return 0;
  transport ??= createTransport(SMTP_URL, { from: MAIL_FROM });
  const mailer = transport;
  let sent = 0;
  while (await sendNextMail(async (mail) => void (await mailer.sendMail({ from: MAIL_FROM, to: mail.to, subject: mail.subject, text: mail.body })))) sent += 1;
  return sent;
}
