import { resolve } from 'node:path';
import { PortTaken, startMailFake } from './server.js';

const SETTING_OF = { smtp: 'KERFSIDE_SMTP_PORT', http: 'KERFSIDE_MAIL_PORT' } as const;

class BadSetting extends Error {}

function readPort(setting: string, fallback: number): number {
  const text = process.env[setting] || String(fallback);
  const port = Number(text);
  if (!/^\d+$/.test(text) || port > 65_535) {
    throw new BadSetting(`${setting} must be a port number, 0 to 65535 (0 takes any free port).`);
  }
  return port;
}

async function main(): Promise<void> {
  const fake = await startMailFake({
    smtpPort: readPort(SETTING_OF.smtp, 4325),
    httpPort: readPort(SETTING_OF.http, 4326),
    dataDir: resolve(process.env.KERFSIDE_MAIL_DATA || '.data/mail'),
  });
  const stop = () => {
    fake.close().then(
      () => process.exit(0),
      (error: unknown) => {
        console.error(error);
        process.exit(1);
      },
    );
  };
  process.on('SIGTERM', stop);
  process.on('SIGINT', stop);
  console.log(`mail-fake is ready: smtp 127.0.0.1:${fake.smtpPort}, http 127.0.0.1:${fake.httpPort}`);
}

main().catch((error: unknown) => {
  if (error instanceof PortTaken) {
    console.error(`Port ${error.port} is taken. Set ${SETTING_OF[error.part]} to a free port and start again.`);
  } else {
    console.error(error instanceof BadSetting ? error.message : error);
  }
  process.exit(1);
});
