import { createWriteStream } from 'node:fs';
import { pipeline } from 'node:stream/promises';
import { SMTPServer, type SMTPServerDataStream, type SMTPServerSession } from 'smtp-server';
import { type Behaviour, type Place, SmtpRefusal } from './behaviour.js';
import type { MessageStore } from './store.js';

export const SIZE_LIMIT_BYTES = 25 * 1024 * 1024;
const CLOSE_AFTER_MS = 300;

type Answer = (error?: Error | null) => void;

/** The SMTP side: takes any sender, recipient and sign-in, and does what the behaviour switch says. */
export function createSmtpServer(store: MessageStore, behaviour: Behaviour): SMTPServer {
  const answerAt = (place: Place, answer: Answer) => {
    const refusal = behaviour.refusalAt(place);
    if (refusal) {
      answer(refusal);
    } else {
      behaviour.pauseAt(place).then(() => answer(), answer);
    }
  };
  return new SMTPServer({
    name: 'mail-fake',
    banner: 'for development and tests',
    size: SIZE_LIMIT_BYTES,
    rejectOversized: true,
    authOptional: true,
    allowInsecureAuth: true,
    // It listens on loopback only and has no certificate to offer.
    disabledCommands: ['STARTTLS'],
    disableReverseLookup: true,
    logger: false,
    closeTimeout: CLOSE_AFTER_MS,
    onAuth: (auth, _session, answer) => answer(null, { user: auth.username || 'anyone' }),
    onConnect: (_session, answer) => answerAt('connect', answer),
    onRcptTo: (_address, _session, answer) => answerAt('rcpt', answer),
    onData: (stream, session, answer) => {
      receive(store, behaviour, stream, session).then(
        (id) => answer(null, `OK: kept as ${id}`),
        (error: Error) => answer(error),
      );
    },
  });
}

async function receive(
  store: MessageStore,
  behaviour: Behaviour,
  stream: SMTPServerDataStream,
  session: SMTPServerSession,
): Promise<string> {
  const { mailFrom, rcptTo } = session.envelope;
  const envelope = { from: mailFrom ? mailFrom.address : '', to: rcptTo.map(({ address }) => address) };
  const file = store.newIncomingFile();
  try {
    await pipeline(stream, (source) => upToTheLimit(source, stream), createWriteStream(file));
    const refusal = behaviour.refusalAt('data');
    if (refusal) {
      throw refusal;
    }
    if (stream.sizeExceeded) {
      throw new SmtpRefusal(552, 'The message is larger than the server takes');
    }
    const { id } = await store.keep(file, envelope);
    // Kept first, answered late: the case in which a sender can't know whether it was taken.
    await behaviour.pauseAt('data');
    return id;
  } catch (error) {
    await store.discard(file);
    throw error instanceof SmtpRefusal ? error : new SmtpRefusal(451, 'The message could not be kept');
  }
}

async function* upToTheLimit(source: AsyncIterable<Buffer>, stream: SMTPServerDataStream): AsyncGenerator<Buffer> {
  for await (const chunk of source) {
    if (!stream.sizeExceeded) {
      yield chunk;
    }
  }
}
