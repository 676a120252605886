import { createServer } from 'node:net';
import { simpleParser, type ParsedMail } from 'mailparser';
import { SMTPServer } from 'smtp-server';
import { closeMail } from '@/lib/infra/mail';
import { forgetEnv } from '@/lib/infra/env';

/** A letter as it arrived: parsed by an independent parser, and as it was on the wire. */
export type Arrived = { mail: ParsedMail; raw: string };

async function freePort(): Promise<number> {
  const server = createServer();
  await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve));
  const address = server.address();
  await new Promise<void>((resolve) => server.close(() => resolve()));
  return typeof address === 'object' && address ? address.port : 0;
}

/** A real mail server on loopback that keeps what it takes; `down` and `up` switch it off and on at the same port. */
export async function aMailServer() {
  const port = await freePort();
  const arrived: Arrived[] = [];
  const state: { server: SMTPServer | null; refuse: string | null } = { server: null, refuse: null };

  const up = async () => {
    const server = new SMTPServer({
      authOptional: true, disabledCommands: ['STARTTLS', 'AUTH'],
      onData(stream, _session, done) {
        const parts: Buffer[] = [];
        stream.on('data', (part: Buffer) => parts.push(part));
        stream.on('end', () => {
          if (state.refuse !== null) return done(Object.assign(new Error(state.refuse), { responseCode: 451 }));
          const raw = Buffer.concat(parts).toString('utf8');
          simpleParser(raw).then((mail) => { arrived.push({ mail, raw }); done(); }, done);
        });
      },
    });
    server.on('error', () => undefined); // a connection cut off by `down` is what the test is about
    await new Promise<void>((resolve) => server.listen(port, '127.0.0.1', resolve));
    state.server = server;
  };
  const down = async () => {
    closeMail();
    const { server } = state;
    state.server = null;
    if (server) await new Promise<void>((resolve) => server.close(() => resolve()));
  };

  await up();
  process.env['SMTP_URL'] = `smtp://127.0.0.1:${port}`;
  forgetEnv();
  return { arrived, state, up, down };
}
