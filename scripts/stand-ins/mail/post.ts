// The SMTP side: takes every letter, or says "later" (451), or is not there at all, as the test at hand wants it.
import { SMTPServer } from 'smtp-server';
import type { Letters } from './letters';

type Answer = 'take' | 'later' | 'none';

export class Post {
  private answer: Answer = 'take';
  private server: SMTPServer | null = null;

  constructor(private readonly letters: Letters, private port: number) {}

  /** Listens on 127.0.0.1 and tells the port. */
  async open(): Promise<number> {
    const server = new SMTPServer({
      disabledCommands: ['AUTH', 'STARTTLS'], logger: false, size: 10 * 1024 * 1024, closeTimeout: 500,
      onMailFrom: (_address, _session, done) => (this.answer === 'later' ? done(tryLater()) : done()),
      onData: (stream, _session, done) => {
        const parts: Buffer[] = [];
        stream.on('data', (part: Buffer) => parts.push(part));
        stream.on('end', () => void this.letters.arrive(Buffer.concat(parts)).then(() => done(), done));
      },
    });
    server.on('error', () => undefined); // a client that went away in the middle
    await new Promise<void>((resolve, reject) => {
      server.server.once('error', reject);
      server.listen(this.port, '127.0.0.1', () => resolve());
    });
    const address = server.server.address();
    this.port = typeof address === 'object' && address ? address.port : this.port;
    this.server = server;
    return this.port;
  }

  async close() {
    const server = this.server;
    this.server = null;
    if (server) await new Promise<void>((resolve) => server.close(() => resolve()));
  }

  /** Changes what clients meet from now on; "none" is a mail server that is down. */
  async answerWith(answer: Answer) {
    this.answer = answer;
    if (answer === 'none') await this.close();
    else if (!this.server) await this.open();
  }
}

const tryLater = () => Object.assign(new Error('Try again later'), { responseCode: 451 });
