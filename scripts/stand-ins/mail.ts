// Stands in for the mail server: started by scripts/start and by the tests. Takes every letter and shows it in a browser.
// MAIL_SMTP_PORT and MAIL_INBOX_PORT say where; MAIL_FOLDER keeps letters over a restart.
import { serveInbox } from './mail/inbox';
import { Letters } from './mail/letters';
import { Post } from './mail/post';

const { MAIL_SMTP_PORT, MAIL_INBOX_PORT, MAIL_FOLDER } = process.env;

const letters = await Letters.open(MAIL_FOLDER ?? null);
const post = new Post(letters, Number(MAIL_SMTP_PORT ?? 0));
const smtpPort = await post.open();
const { server, origin } = await serveInbox(letters, post, Number(MAIL_INBOX_PORT ?? 0));
console.log(`mail stand-in at smtp://127.0.0.1:${smtpPort}, inbox at ${origin}`);

async function stop() {
  server.close();
  server.closeAllConnections();
  await post.close();
  process.exit(0);
}
process.on('SIGTERM', () => void stop());
process.on('SIGINT', () => void stop());
